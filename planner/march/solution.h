#pragma once
// What a solve returns: an immutable report of the line, its balances and how the solve ended.
// SI units; moisture dry basis. A search that did not succeed is a status here, not an exception.

#include <cstddef>
#include <optional>
#include <string>
#include <vector>

#include "planner/field/validity.h"
#include "planner/line/flow.h"
#include "planner/line/line.h"
#include "planner/line/topology.h"
#include "planner/product/provenance.h"

namespace lossline {

enum class Status { solved, not_converged, refused, interrupted };
enum class Level { mean, depth };

/// One station along the belt. x counts from the start of the first stretch.
struct Station {
  double x = 0;                 ///< [m]
  std::size_t stretch = 0;      ///< index into Line::stretches
  double moisture = 0;          ///< mean over the depth
  double surface_moisture = 0;  ///< at the exposed face (or the granule's surface)
  double temperature = 0;       ///< mean over the depth [K]
  double cure = 0;              ///< degree of cure
  double overpressure = 0;      ///< of vapour inside the product [Pa]
  double air_temperature = 0;   ///< the air the product meets [K]
  double air_humidity = 0;      ///< [kg/kg dry air]
  double product_power = 0;     ///< field heat per belt length [W/m]
  double evaporation = 0;       ///< per belt length [kg/(s m)]
  double air_heat = 0;          ///< from the air to the product per belt length [W/m]
  double heating_rate = 0;      ///< dT/dt [K/s]
  double drying_rate = 0;       ///< -dX/dt [1/s]
  double eps_real = 0;          ///< permittivity at the stretch's frequency (0 outside cavities)
  double loss_factor = 0;
  double penetration_depth = 0;  ///< power, 1/e [m]
};

/// The power ledger of one cavity [W]. launched = bed + belt + walls + returned + ends + links.
struct CavityReport {
  std::string name;
  std::size_t stretch = 0;
  double frequency = 0;  ///< [Hz]
  double launched = 0;   ///< enters the cavity through its launchers
  double bed = 0, bed_top = 0, bed_bottom = 0, bed_side = 0;
  double belt = 0;
  double walls = 0;
  double returned = 0;        ///< leaves through the launchers
  double ends = 0;            ///< leaves through open ends
  double links = 0;           ///< net outflow to neighbour cavities
  double other = 0;           ///< outside the product, not assigned (constant share only)
  double field_above = 0;     ///< mean rms field above the belt [V/m]
  double field_below = 0;     ///< below the belt [V/m]
  double share_unmixed = 0;   ///< bed over launched with no mixing at the final state
  double share_mixed = 0;     ///< with complete mixing
  double share_low = 0;       ///< cautious low bound (planner/field/validity.h)
  double modal_overlap = 0;   ///< 1
  double hot_spot_pitch = 0;  ///< half a free-space wavelength [m]
  double uneven_low = 0,
         uneven_high = 0;  ///< relative spread of belt-averaged heat across the belt
  std::vector<field::ValidityFlag> validity;
};

/// One generator.
struct GeneratorReport {
  std::string name;
  double rated = 0, output = 0;  ///< [W]
  double mains = 0, supply_loss = 0, tube_loss = 0;
  double run_loss = 0;   ///< both ways [W]
  double launched = 0;   ///< enters cavities [W]
  double reflected = 0;  ///< back at the flange, run loss on the way deducted [W]
};

/// One air loop.
struct AirReport {
  std::string name;
  double dry_air_flow = 0;    ///< through the product [kg/s]
  double fresh_air_flow = 0;  ///< [kg/s]
  double supply_temperature = 0, supply_humidity = 0;
  double exhaust_temperature = 0, exhaust_humidity = 0;
  double exhaust_relative_humidity = 0;  ///< 1
  double exhaust_dew_point = 0;          ///< [K]
  double heater_duty = 0;                ///< heat to the air [W]
  double heater_bought = 0;              ///< energy bought [W]
  double fan_power = 0;                  ///< mains [W]
  double shell_loss = 0;                 ///< [W]
  double water_taken = 0;                ///< [kg/s]
  bool fog = false;                      ///< saturated somewhere in the loop
};

/// What arrives at an open end of the tunnel [W].
struct EndReport {
  std::string name;      ///< of the trap
  double frequency = 0;  ///< [Hz]
  double arriving = 0;   ///< at the mouth of the trap
  double taken = 0;      ///< not sent back: ends in the absorbing part or leaves
  double leaving = 0;    ///< passes the absorbing part
};

/// The answer at the two ends of the band of an estimated permittivity.
struct EstimateBand {
  double final_moisture_low_loss = 0, final_moisture_high_loss = 0;  ///< dry basis
  double share_low_loss = 0, share_high_loss = 0;      ///< bed over generator output, 1
  double hottest_low_loss = 0, hottest_high_loss = 0;  ///< [K]
  bool converged = false;                              ///< both ends solved
};

/// Where every watt of mains goes:
/// generator mains = supply + tubes + run + reflected + bed + belt + walls + ends + other.
struct PowerLedger {
  double generator_mains = 0, supply_loss = 0, tube_loss = 0, forward = 0, run_loss = 0,
         reflected = 0, bed = 0, belt = 0, walls = 0, ends = 0, other = 0;  ///< [W]
  double air_heating = 0, fans = 0;  ///< bought for the air [W]
  double mains = 0;                  ///< electricity bought in all [W]
  double fuel = 0;                   ///< fuel or steam bought [W]
};

/// Energy balance of the product stream [W]: in + field + air + reaction = out + vapour.
struct ProductLedger {
  double sensible_solids = 0;  ///< heating the dry solid
  double sensible_water = 0;   ///< heating the water that stays
  double evaporation = 0;      ///< feed-temperature liquid to vapour leaving
  double bound_water = 0;      ///< extra for bound water
  double reaction = 0;         ///< released by cure, positive
  double field = 0;            ///< from the field
  double air = 0;              ///< from the air (negative: given to the air)
};

/// Closing errors, relative.
struct Balances {
  double water = 0;   ///< over water in
  double energy = 0;  ///< over field plus absolute air heat
  double power = 0;   ///< over generator mains
};

/// One material quantity the result rests on.
struct EvidenceItem {
  std::string quantity;
  Provenance provenance;
  Flags flags;       ///< union over the run
  std::string note;  ///< what was assumed when nothing was known
};

/// The answer's headline numbers.
struct Answer {
  ProductFlow flow;
  double heated_length = 0, length = 0;                                    ///< [m]
  double residence = 0, heated_residence = 0;                              ///< [s]
  double feed_rate = 0, product_rate = 0, dry_solids = 0, evaporated = 0;  ///< [kg/s]
  double final_moisture = 0;
  double final_moisture_low = 0,
         final_moisture_high =
             0;  ///< 5 % and 95 % of the mass; equal to the mean when no spread is known
  bool spread_known = false;
  double final_temperature = 0;
  double hottest_temperature = 0;
  double hottest_x = 0;
  double fastest_heating = 0, fastest_heating_x = 0;  ///< [K/s], [m]
  double fastest_drying = 0, fastest_drying_x = 0;
  double highest_overpressure = 0, highest_overpressure_x = 0;
  double degree_of_cure = 0;
  double share_of_forward = 0;   ///< bed over generator output
  double mains_per_water = 0;    ///< electricity bought over water evaporated [J/kg]
  double energy_per_water = 0;   ///< electricity and fuel over water evaporated [J/kg]
  double mains_per_product = 0;  ///< [J/kg product out]
  double energy_floor =
      0;  ///< least possible: feed-temperature water to vapour at the tunnel pressure [J/kg]
};

/// Everything a solve found.
struct Solution {
  Status status = Status::refused;
  std::string reason;  ///< one sentence: why it stopped, or why it was refused
  Level level = Level::mean;
  Balance balance = Balance::full;
  std::string version;    ///< of the program
  double wall_time = 0;   ///< [s]
  int rounds = 0;         ///< passes over the line
  int cavity_rounds = 0;  ///< field solves in all
  long steps = 0;         ///< time steps of the product
  double residual = 0;    ///< last relative change of the iterated quantities

  Answer answer;
  PowerLedger power;
  ProductLedger product;
  std::vector<CavityReport> cavities;
  std::vector<GeneratorReport> generators;
  std::vector<AirReport> air;
  std::vector<EndReport> ends;
  std::optional<EstimateBand> band;  ///< present when the permittivity is an estimate
  std::vector<Station> profile;
  Balances balances;
  std::vector<EvidenceItem> evidence;
  Flags flags;  ///< union of all evidence flags
  Topology topology;
};

}  // namespace lossline
