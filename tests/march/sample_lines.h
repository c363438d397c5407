#pragma once
// Lines and products built in code for the tests of the march. All values are invented.

#include <complex>
#include <memory>

#include "planner/line/line.h"
#include "planner/product/card.h"

namespace lossline::sample {

/// Permittivity that is a straight function of moisture: eps' = 2 + 20 X, eps'' = loss (0.05 + 8
/// X).
class StraightPermittivity : public Permittivity {
 public:
  explicit StraightPermittivity(double loss) : loss_(loss) {}
  [[nodiscard]] Valued<std::complex<double>> at(double X, double, double) const override {
    return {{2 + 20 * X, -loss_ * (0.05 + 8 * X)}, {}};
  }

 private:
  double loss_;
};

/// A porous solid whose water is free and whose pores are open.
inline ProductCard open_card(double loss = 1) {
  ProductCard card;
  card.id = "sample";
  card.name = "Sample";
  card.permittivity = std::make_shared<const StraightPermittivity>(loss);
  card.sorption = std::make_shared<const product::Sorption>(product::Sorption::free_water());
  card.dry_heat_capacity = Property{1300, {}};
  card.dry_bulk_density = Property{400, {}};
  card.permeability = Property{1e-9, {}};
  card.conductivity = Property{0.2, {}};
  card.diffusivity = Property{1e-9, {}};
  card.vapour_factor = Property{0.3, {}};
  return card;
}

/// `cavities` cavities of 1.2 m at 2.45 GHz with 15 kW each, between an air stretch and a rest.
inline Line small_line(int cavities = 2) {
  Line line;
  line.name = "sample";
  line.duty.feed_moisture = 0.40;
  line.duty.feed_temperature = 313.15;
  line.product.material = "sample";
  line.product.kind = ProductKind::slab;
  line.belt.width = 0.9;
  line.belt.speed = 0.01;
  line.belt.open_share = 0.3;
  line.feed.width = 0.8;
  line.feed.depth = 0.03;
  line.inlet_trap = EndTrap{"inlet trap", {0.85, 0.05}, 0.8, 20, 10, "sample"};
  line.outlet_trap = EndTrap{"outlet trap", {0.85, 0.05}, 0.8, 20, 10, "sample"};
  auto stretch = [](const char* name, StretchKind kind, double length) {
    Stretch s;
    s.name = name;
    s.kind = kind;
    s.length = length;
    s.heat_transfer_top = 20;
    s.air = "main";
    return s;
  };
  line.stretches.push_back(stretch("warm-up", StretchKind::air, 1.0));
  for (int i = 1; i <= cavities; ++i) {
    Stretch s = stretch("", StretchKind::microwave, 1.2);
    s.name = "cavity " + std::to_string(i);
    s.width = 1.0;
    s.height = 0.8;
    s.passage = Opening{0.85, 0.05};
    line.stretches.push_back(s);
    Generator g;
    g.name = "G" + std::to_string(i);
    g.frequency = 2.45e9;
    g.rated = 15e3;
    g.set_point = 12e3;
    g.tube_efficiency = 0.7;
    g.supply_efficiency = 0.92;
    g.launcher_reflection = 0.02;
    g.run = {0.0864, 0.0432, 3, 2.62e-8, 1.3};
    g.feeds = {{s.name, 1.0}};
    line.generators.push_back(g);
  }
  line.stretches.push_back(stretch("rest", StretchKind::rest, 0.6));
  AirLoop air;
  air.name = "main";
  air.pattern = AirPattern::cross;
  air.dry_air_flow = 0.4;
  air.supply_temperature = 353.15;
  air.recycle = 0.5;
  air.fan_power = 1500;
  air.shell_conductance = 20;
  line.air.push_back(air);
  return line;
}

}  // namespace lossline::sample
