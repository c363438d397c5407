// [belt], [feed], [[stretch]] and the end traps.

#include <array>
#include <string>

#include "planner/linefile/keys.h"

namespace lossline::linefile {
namespace {

const std::array<std::string, 4> kinds{"microwave", "air", "rest", "cooling"};

void cavity_fields(Fields& f, Stretch& stretch) {
  const Stretch fresh;
  f.required("width", stretch.width, range::cavity_size);
  f.required("height", stretch.height, range::cavity_size);
  f.optional("belt_height_share", stretch.belt_height_share, range::belt_height_share,
             fresh.belt_height_share);
  f.optional("wall_resistivity", stretch.wall_resistivity, range::resistivity,
             fresh.wall_resistivity);
  f.optional("wall_relative_permeability", stretch.wall_relative_permeability,
             range::relative_permeability, fresh.wall_relative_permeability);
  f.optional("wall_roughness_factor", stretch.wall_roughness_factor, range::roughness_factor,
             fresh.wall_roughness_factor);
  f.optional("mixing", stretch.mixing, range::mixing, fresh.mixing);
  double launchers = stretch.launchers;
  f.optional("launchers", launchers, range::launchers, fresh.launchers);
  stretch.launchers = static_cast<int>(launchers);
  std::optional<double> width, height;
  if (stretch.passage) {
    width = stretch.passage->width;
    height = stretch.passage->height;
  }
  f.optional("passage_width", width, range::opening);
  f.optional("passage_height", height, range::opening);
  if (f.reading() && width && height) stretch.passage = Opening{*width, *height};
}

}  // namespace

void belt_fields(Fields& f, Belt& belt) {
  const Belt fresh;
  f.optional("speed", belt.speed, range::belt_speed);
  f.required("width", belt.width, range::belt_width);
  f.optional("thickness", belt.thickness, range::belt_thickness, fresh.thickness);
  double stored = belt.eps.real(), lost = -belt.eps.imag();
  f.optional("eps_real", stored, range::eps_real, fresh.eps.real());
  f.optional("loss_factor", lost, range::loss_factor, -fresh.eps.imag());
  belt.eps = {stored, -lost};
  evidence_fields(f, belt.eps_provenance);
  f.optional("open_share", belt.open_share, range::open_share, fresh.open_share);
}

void feed_fields(Fields& f, Feed& feed, std::optional<ProductKind> kind) {
  f.optional("width", feed.width, range::belt_width);
  f.optional("depth", feed.depth, range::depth);
  f.optional("bulk_density", feed.bulk_density, range::density);
  if (!kind || *kind == ProductKind::granular_bed) {
    f.optional("piece_size", feed.piece_size, range::piece);
    f.optional("void_share", feed.void_share, range::void_share);
  } else {
    static constexpr std::array idle{"piece_size", "void_share"};
    f.idle(idle, "only a granular bed is made of granules");
  }
  if (!kind || *kind == ProductKind::profile) {
    f.optional("mass_per_length", feed.mass_per_length, range::mass_per_length);
  } else {
    static constexpr std::array idle{"mass_per_length"};
    f.idle(idle, "only a profile is stated by its mass per length");
  }
  if (!kind || *kind == ProductKind::pieces) {
    f.optional("piece_rate", feed.piece_rate, range::piece_rate);
    f.optional("piece_mass", feed.piece_mass, range::piece_mass);
    f.optional("piece_length", feed.piece_length, range::piece);
    f.optional("piece_width", feed.piece_width, range::piece);
    f.optional("piece_height", feed.piece_height, range::piece);
    f.optional("lanes", feed.lanes, range::lanes);
  } else {
    static constexpr std::array idle{"piece_rate",  "piece_mass",   "piece_length",
                                     "piece_width", "piece_height", "lanes"};
    f.idle(idle, "only a product of kind \"pieces\" is counted in pieces");
  }
  f.optional("moisture_spread", feed.moisture_spread, range::moisture_difference);
  f.optional("load_spread", feed.load_spread, range::load_spread);
}

void stretch_fields(Fields& f, Stretch& stretch) {
  const Stretch fresh;
  f.text("name", stretch.name, Need::required);
  const bool known = f.choice("kind", kinds, stretch.kind, Need::required);
  f.required("length", stretch.length, range::stretch_length);
  static constexpr std::array cavity_keys{
      "width",  "height",    "belt_height_share", "wall_resistivity", "wall_relative_permeability",
      "mixing", "launchers", "passage_width",     "passage_height",   "wall_roughness_factor"};
  if (!known)
    f.forgive(cavity_keys);
  else if (stretch.kind == StretchKind::microwave)
    cavity_fields(f, stretch);
  else
    f.idle(cavity_keys, "only a microwave stretch is a cavity");
  f.text("air", stretch.air, Need::optional);
  f.optional("heat_transfer_top", stretch.heat_transfer_top, range::heat_transfer,
             fresh.heat_transfer_top);
  f.optional("heat_transfer_belt", stretch.heat_transfer_belt, range::heat_transfer,
             fresh.heat_transfer_belt);
}

void end_trap_fields(Fields& f, EndTrap& trap) {
  f.required("opening_width", trap.opening.width, range::opening);
  f.required("opening_height", trap.opening.height, range::opening);
  f.required("length", trap.length, range::trap_length);
  f.required("reflective_attenuation", trap.reflective_attenuation, range::attenuation);
  f.required("absorbing_attenuation", trap.absorbing_attenuation, range::attenuation);
  f.text("guaranteed_by", trap.guaranteed_by, Need::optional);
}

}  // namespace lossline::linefile
