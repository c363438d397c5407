#include "planner/report/text.h"

#include <fmt/format.h>

#include <map>

#include "planner/report/text_parts.h"
#include "planner/verdict/evidence.h"

namespace lossline::report {
namespace {

const char* status_words(Status status) {
  switch (status) {
    case Status::solved:
      return "solved";
    case Status::not_converged:
      return "NOT CONVERGED";
    case Status::interrupted:
      return "INTERRUPTED";
    case Status::refused:
      break;
  }
  return "REFUSED";
}

const char* kind_words(ProductKind kind) {
  switch (kind) {
    case ProductKind::granular_bed:
      return "bed";
    case ProductKind::slab:
      return "sheet";
    case ProductKind::profile:
      return "profile";
    case ProductKind::pieces:
      break;
  }
  return "pieces";
}

/// "2 x 75 kW and 1 x 30 kW at 915 MHz".
std::string installed(const Line& line) {
  std::map<std::pair<double, double>, int> groups;
  for (const Generator& g : line.generators) ++groups[{g.frequency, g.rated}];
  std::string out;
  for (const auto& [kind, count] : groups)
    out += fmt::format("{}{} x {:g} kW at {:.5g} MHz", out.empty() ? "" : ", ", count,
                       1e-3 * kind.second, 1e-6 * kind.first);
  return out.empty() ? "no generators" : out;
}

std::string title(const Page& page) {
  const Solution& s = page.solution;
  const std::string right = fmt::format("level {}, {}", s.level == Level::mean ? "mean" : "depth",
                                        status_words(s.status));
  const std::size_t left = static_cast<std::size_t>(page_width) - right.size() - 2;
  std::string out = cut(page.line.name.empty() ? page.file : page.line.name, left) + "  " + right;
  out += '\n';
  const std::string time = s.status == Status::refused
                               ? std::string()
                               : fmt::format("; {} round{} in {:.0f} ms", s.rounds,
                                             s.rounds == 1 ? "" : "s", 1e3 * s.wall_time);
  out += wrapped("",
                 fmt::format("{}: {}; {}{}; Lossline {}", page.file, page.line.product.material,
                             installed(page.line), time, s.version),
                 0);
  return out;
}

std::string duty(const Page& page, const Setting& set) {
  const Answer& a = page.solution.answer;
  const Duty& d = page.line.duty;
  std::string asked = fmt::format("{} at {} and {}", with_unit(Shown::mass_rate, a.feed_rate, set),
                                  both_bases(d.feed_moisture),
                                  with_unit(Shown::temperature, d.feed_temperature, set));
  if (d.target_moisture) {
    asked += ", to " + both_bases(*d.target_moisture);
    if (d.moisture_tolerance)
      asked += fmt::format(" {} {} db", set.unicode ? "\u00b1" : "+-",
                           figures(*d.moisture_tolerance, 2));
  }
  if (d.target_cure) asked += fmt::format(", to cure {}", figures(*d.target_cure));
  std::string out = wrapped("Duty     ", asked, 9);
  const ProductFlow& f = a.flow;
  std::string lies = fmt::format("{} {} deep, {} wide, {} dry", kind_words(page.line.product.kind),
                                 with_unit(Shown::small_length, f.depth, set),
                                 with_unit(Shown::length, f.width, set),
                                 with_unit(Shown::areal_mass, f.dry_areal_mass, set));
  if (f.coverage < 1) lies += fmt::format(", covering {} %", figures(100 * f.coverage));
  lies += fmt::format("; belt {}, {} min, {} in cavities", with_unit(Shown::speed, f.speed, set),
                      figures(a.residence / 60), figures(a.heated_residence / 60));
  return out + wrapped("         ", lies, 9);
}

std::string answer(const Page& page, const Setting& set) {
  const Answer& a = page.solution.answer;
  std::string first = fmt::format(
      "{} of product at {} and {}", with_unit(Shown::mass_rate, a.product_rate, set),
      both_bases(a.final_moisture), with_unit(Shown::temperature, a.final_temperature, set));
  if (a.spread_known)
    first += fmt::format("; 5 to 95 % of it {} to {} db", figures(a.final_moisture_low),
                         figures(a.final_moisture_high));
  std::string out = wrapped("Answer   ", first, 9);
  std::string second = fmt::format("{} of water evaporated; hottest {} at {}",
                                   with_unit(Shown::mass_rate, a.evaporated, set),
                                   with_unit(Shown::temperature, a.hottest_temperature, set),
                                   with_unit(Shown::length, a.hottest_x, set));
  if (page.line.duty.target_cure || a.degree_of_cure > 0)
    second += fmt::format("; degree of cure {}", figures(a.degree_of_cure));
  out += wrapped("         ", second, 9);
  std::string third = with_unit(Shown::energy_per_product, a.mains_per_product, set) + " product";
  if (verdict::dries(page.solution)) {
    auto figure = [&](double energy) {
      return figures(in_unit(Shown::energy_per_mass, energy, set.units));
    };
    std::string beside = "least possible " + figure(a.energy_floor);
    if (a.energy_per_water > a.mains_per_water)
      beside = figure(a.energy_per_water) + " with fuel, " + beside;
    third = fmt::format("{} water ({}), {}",
                        with_unit(Shown::energy_per_mass, a.mains_per_water, set), beside, third);
  }
  third = "mains " + third;
  out += wrapped("         ", third, 9);
  if (page.solution.band) {
    const EstimateBand& b = *page.solution.band;
    out += wrapped(
        "         ",
        fmt::format("permittivity is an estimate: at the ends of its band {} and {} db, hottest {} "
                    "and {}{}",
                    figures(b.final_moisture_low_loss), figures(b.final_moisture_high_loss),
                    with_unit(Shown::temperature, b.hottest_low_loss, set),
                    with_unit(Shown::temperature, b.hottest_high_loss, set),
                    b.converged ? "" : " (an end did not converge)"),
        9);
  }
  return out;
}

std::string closing(const Page& page) {
  const Balances& b = page.solution.balances;
  return wrapped("Closure  ",
                 fmt::format("water {:.0e}, energy {:.0e}, power {:.0e} (relative)", b.water,
                             b.energy, b.power),
                 9);
}

}  // namespace

std::string cut(const std::string& text, std::size_t columns) {
  std::size_t bytes = 0, count = 0;
  while (bytes < text.size() && count < columns) {
    ++bytes;
    while (bytes < text.size() && (static_cast<unsigned char>(text[bytes]) & 0xC0u) == 0x80u)
      ++bytes;
    ++count;
  }
  return text.substr(0, bytes) + std::string(columns - count, ' ');
}

std::string wrapped(const std::string& first, const std::string& words, std::size_t indent) {
  std::string out = first;
  std::size_t column = first.size(), start = 0;
  bool empty = true;
  while (start < words.size()) {
    std::size_t end = words.find(' ', start);
    if (end == std::string::npos) end = words.size();
    const std::string word = words.substr(start, end - start);
    start = end + 1;
    std::size_t length = 0;
    for (const char c : word) length += (static_cast<unsigned char>(c) & 0xC0u) != 0x80u ? 1 : 0;
    if (!empty && column + 1 + length > static_cast<std::size_t>(page_width)) {
      out += '\n' + std::string(indent, ' ');
      column = indent;
      empty = true;
    }
    if (!empty) {
      out += ' ';
      ++column;
    }
    out += word;
    column += length;
    empty = false;
  }
  return out + '\n';
}

std::string text(const Page& page, const Setting& setting) {
  std::string out = title(page);
  for (const std::string& stamp : verdict::stamps(page.line, page.solution))
    out += "[ " + stamp + " ]\n";
  if (page.solution.status != Status::solved) out += wrapped("", page.solution.reason, 0);
  if (page.solution.status == Status::refused || page.solution.profile.empty()) return out;
  out += '\n' + duty(page, setting) + answer(page, setting);
  out += '\n' + power_section(page, setting);
  out += '\n' + stretch_section(page, setting);
  if (!page.solution.cavities.empty() && page.solution.balance == Balance::full)
    out += '\n' + cavity_section(page, setting);
  if (!page.solution.air.empty()) out += '\n' + air_section(page, setting);
  out += '\n' + margin_section(page, setting);
  out += '\n' + caution_section(page) + evidence_section(page) + closing(page);
  return out;
}

}  // namespace lossline::report
