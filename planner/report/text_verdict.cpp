// The verdict of the text page: margins, cautions, evidence.

#include <fmt/format.h>

#include <algorithm>
#include <map>
#include <set>

#include "planner/report/text_parts.h"
#include "planner/verdict/evidence.h"

namespace lossline::report {
namespace {

using verdict::Margin;
using verdict::Standing;

/// Rows of margins on the page; those beyond, near or unknown are always shown.
constexpr std::size_t rows_wanted = 10;

const char* sign(Standing standing) {
  switch (standing) {
    case Standing::within:
      return "+";
    case Standing::near:
      return "~";
    case Standing::beyond:
      return "!";
    case Standing::unknown:
      break;
  }
  return "?";
}

/// Where, and how many more rows of the same name and standing are not shown.
std::string place(const Margin& m, std::size_t more, const Setting& set) {
  if (more > 0) return fmt::format("{} +{}", m.where, more);
  if (!m.x) return m.where;
  return fmt::format("{} {}", m.where, with_unit(Shown::length, *m.x, set, 2));
}

std::string number(const Margin& m, const std::optional<double>& value, const Setting& set) {
  if (!value) return "-";
  if (m.measure == verdict::Measure::moisture) return moisture_figures(*value) + " db";
  return with_unit(shown_as(m.measure), *value, set);
}

std::string room(const Margin& m, const Setting& set) {
  if (!m.margin) return "-";
  if (m.measure == verdict::Measure::temperature)
    return with_unit(Shown::temperature_step, *m.margin, set);
  return number(m, m.margin, set);
}

std::string origin_words(std::string origin) {
  std::replace(origin.begin(), origin.end(), '_', ' ');
  return origin;
}

std::string trimmed(std::string text) {
  while (!text.empty() && text.back() == ' ') text.pop_back();
  return text;
}

std::string margin_row(const Margin& m, bool binding, std::size_t more, const Setting& set) {
  const std::string limit =
      m.limit ? (m.at_least ? ">= " : "<= ") + number(m, m.limit, set) : std::string("-");
  return fmt::format("{} {} {} {:>12} {:>15} {:>11}  {}", sign(m.standing),
                     cut(verdict::standing_word(m.standing), 7),
                     cut(m.name + (binding ? " <-" : ""), 28), number(m, m.value, set), limit,
                     room(m, set), trimmed(cut(place(m, more, set), 19))) +
         '\n';
}

}  // namespace

std::string margin_section(const Page& page, const Setting& setting) {
  const std::vector<Margin>& all = page.margins.all;
  std::string out = fmt::format("{:<9} {:<28} {:>12} {:>15} {:>11}  {}\n", "Margins", "", "value",
                                "limit", "room", "where");
  std::size_t shown = 0, left = 0;
  std::set<std::pair<std::string, Standing>> seen;
  for (std::size_t i = 0; i < all.size(); ++i) {
    const Margin& m = all[i];
    std::size_t count = 1;
    if (m.origin == "plan" || m.origin == "generator") {
      // Many generators fare alike: the one with the least room stands for them.
      if (!seen.insert({m.name, m.standing}).second) continue;
      count = static_cast<std::size_t>(std::count_if(all.begin(), all.end(), [&](const Margin& o) {
        return o.name == m.name && o.standing == m.standing;
      }));
    }
    if (m.standing == Standing::within && shown >= rows_wanted) {
      left += count;
      continue;
    }
    out += margin_row(m, page.margins.binding == i, count - 1, setting);
    ++shown;
  }
  if (all.empty()) out += "  no limit is stated\n";
  if (left > 0) out += fmt::format("  and {} more within\n", left);
  if (page.margins.binding)
    out += wrapped(
        "  <- binds: ",
        fmt::format("{} ({}){}", all[*page.margins.binding].name, all[*page.margins.binding].origin,
                    all[*page.margins.binding].reason.empty()
                        ? std::string()
                        : ": " + all[*page.margins.binding].reason),
        4);
  return out;
}

std::string caution_section(const Page& page) {
  std::map<std::string, std::string> titles, places;
  std::string always;
  std::vector<std::string> order;
  for (const verdict::Caution& c : page.cautions) {
    if (c.always) {
      always += (always.empty() ? "" : " ") + c.id;
      continue;
    }
    if (titles.emplace(c.id, c.title).second) order.push_back(c.id);
    if (!c.where.empty() && places[c.id].find(c.where) == std::string::npos)
      places[c.id] += (places[c.id].empty() ? "" : ", ") + c.where;
  }
  std::string raised;
  for (const std::string& id : order) {
    raised += (raised.empty() ? "" : "; ") + id + ' ' + titles[id];
    if (!places[id].empty()) raised += " (" + places[id] + ')';
  }
  if (!always.empty()) raised += (raised.empty() ? "always " : "; always ") + always;
  if (raised.empty()) raised = "none";
  return wrapped("Cautions ",
                 raised +
                     "; not assessed C18 C20, explosive areas, machine safety. Wording and "
                     "deciding documents: "
                     "--format json",
                 9);
}

std::string evidence_section(const Page& page) {
  const verdict::EvidenceSummary e = verdict::evidence_summary(page.solution);
  std::string words = e.sentence;
  for (const auto& [origin, quantities] : e.unverified) {
    std::string list;
    for (const std::string& quantity : quantities) list += (list.empty() ? "" : ", ") + quantity;
    words += fmt::format("; {}: {}", origin_words(origin), list);
  }
  return wrapped("Evidence ", words, 9);
}

}  // namespace lossline::report
