// [product] and the tables below it.

#include <array>
#include <string>

#include "planner/linefile/evidence_words.h"
#include "planner/linefile/keys.h"

namespace lossline::linefile {
namespace {

const std::array<std::string, 4> kinds{"granular bed", "slab", "profile", "pieces"};
const std::array<std::string, 2> phases{"bulk", "piece"};

void override_fields(Fields& f, ProductOverrides& o) {
  evidence_fields(f, o.provenance);
  f.optional("dry_heat_capacity", o.dry_heat_capacity, range::heat_capacity);
  f.optional("dry_heat_capacity_slope", o.dry_heat_capacity_slope, range::heat_capacity_slope);
  f.optional("dry_bulk_density", o.dry_bulk_density, range::density);
  f.optional("dry_piece_density", o.dry_piece_density, range::density);
  f.optional("solid_density", o.solid_density, range::density);
  f.optional("shrinkage", o.shrinkage, range::shrinkage);
  f.optional("conductivity", o.conductivity, range::conductivity);
  f.optional("conductivity_slope", o.conductivity_slope, range::conductivity_slope);
  f.optional("diffusivity", o.diffusivity, range::diffusivity);
  f.optional("diffusivity_activation", o.diffusivity_activation, range::activation_energy);
  f.optional("diffusivity_half_moisture", o.diffusivity_half_moisture, range::scale_moisture);
  f.optional("permeability", o.permeability, range::permeability);
  f.optional("vapour_factor", o.vapour_factor, range::vapour_factor);
  f.optional("saturation_moisture", o.saturation_moisture, range::scale_moisture);
  f.optional("heat_of_reaction", o.heat_of_reaction, range::heat_of_reaction);
}

void sorption_fields(Fields& f, SorptionOverride& s) {
  f.flag("free_water", s.free_water);
  if (s.free_water) {
    static constexpr std::array idle{"oswin_scale", "oswin_exponent", "reference_temperature",
                                     "heat_at_zero", "heat_decay_moisture"};
    f.idle(idle, "all water is free water here");
    return;
  }
  f.required("oswin_scale", s.oswin_scale, range::scale_moisture);
  f.required("oswin_exponent", s.oswin_exponent, range::oswin_exponent);
  f.required("reference_temperature", s.reference_temperature, range::sorption_temperature);
  f.required("heat_at_zero", s.heat_at_zero, range::sorption_heat);
  f.required("heat_decay_moisture", s.heat_decay_moisture, range::scale_moisture);
}

void cure_fields(Fields& f, CureOverride& c) {
  f.required("time_to_90", c.time_to_90, range::cure_time);
  f.required("reference_temperature", c.reference_temperature, range::cure_temperature);
  f.required("activation_energy", c.activation_energy, range::activation_energy);
}

void point_fields(Fields& f, PermittivityPoint& point) {
  f.required("frequency", point.frequency, range::frequency);
  f.required("moisture", point.moisture, range::moisture);
  f.required("temperature", point.temperature, range::product_temperature);
  double stored = point.eps.real(), lost = -point.eps.imag();
  f.required("eps_real", stored, range::eps_real);
  f.required("loss_factor", lost, range::loss_factor);
  point.eps = {stored, -lost};
}

void permittivity_fields(Fields& f, ProductOverrides& o) {
  f.choice("phase", phases, o.permittivity_phase, Need::required);
  evidence_fields(f, o.permittivity_provenance);
  f.list("point", o.permittivity, Need::required, point_fields);
}

bool any_scalar(const ProductOverrides& o) {
  return o.dry_heat_capacity || o.dry_heat_capacity_slope || o.dry_bulk_density ||
         o.dry_piece_density || o.solid_density || o.shrinkage || o.conductivity ||
         o.conductivity_slope || o.diffusivity || o.diffusivity_activation ||
         o.diffusivity_half_moisture || o.permeability || o.vapour_factor ||
         o.saturation_moisture || o.heat_of_reaction;
}

/// A table that becomes an optional struct.
template <class T>
void optional_table(Fields& f, const char* key, std::optional<T>& value,
                    void (*fields)(Fields&, T&)) {
  T item = value.value_or(T{});
  const bool there =
      f.table(key, value.has_value(), Need::optional, [&](Fields& t) { fields(t, item); });
  if (f.reading() && there) value = item;
}

}  // namespace

void evidence_fields(Fields& f, Provenance& provenance) {
  std::size_t word = f.reading() ? evidence_words().size() : word_of(provenance.evidence);
  if (f.word("evidence", evidence_words(), word, Need::optional) && f.reading())
    set_evidence(provenance, evidence_words()[word]);
  std::string source = f.reading() || provenance.source == own_source ? "" : provenance.source;
  f.text("source", source, Need::optional);
  if (f.reading()) provenance.source = source.empty() ? own_source : source;
}

bool product_fields(Fields& f, Product& product) {
  ProductOverrides& o = product.overrides;
  f.text("material", product.material, Need::required);
  const bool kind_known = f.choice("kind", kinds, product.kind, Need::required);
  f.flag("contains_metal", product.contains_metal);
  f.flag("combustible", product.combustible);
  f.flag("dusty", product.dusty);
  f.flag("food", product.food);
  f.flag("fumes", product.fumes);
  f.text("flammable_vapour", product.flammable_vapour, Need::optional);
  const bool any_given = any_scalar(o) || o.sorption || o.cure;
  f.table("override", any_given, Need::optional, [&](Fields& t) { override_fields(t, o); });
  optional_table(f, "sorption", o.sorption, sorption_fields);
  optional_table(f, "cure", o.cure, cure_fields);
  f.table("permittivity", !o.permittivity.empty(), Need::optional,
          [&](Fields& t) { permittivity_fields(t, o); });
  return kind_known;
}

}  // namespace lossline::linefile
