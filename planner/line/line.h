#pragma once
// What a line is made of: plain structs, filled by the line-file reader, read by the topology,
// the march and the verdict. SI units; moisture is dry basis [kg/kg]; optional means "not given".

#include <complex>
#include <optional>
#include <string>
#include <vector>

#include "planner/product/overrides.h"

namespace lossline {

/// What the line must achieve.
struct Duty {
  /// At most one rate is given; the others follow (planner/line/flow.h). All [kg/s].
  std::optional<double> feed_rate;           ///< wet product in
  std::optional<double> product_rate;        ///< product out at the target moisture
  std::optional<double> dry_solids_rate;     ///< dry solids
  double feed_moisture = 0;                  ///< dry basis
  double feed_temperature = 293.15;          ///< [K]
  double feed_cure = 0;                      ///< degree of cure on entry, 0..1
  std::optional<double> target_moisture;     ///< dry basis
  std::optional<double> moisture_tolerance;  ///< +- around the target, dry basis
  std::optional<double> target_cure;         ///< least degree of cure on exit, 0..1
  std::optional<double> hours_per_year;      ///< [s] of operation per year
  std::string country;                       ///< free text, for band legality; may be empty
};

/// How the product lies on the belt.
enum class ProductKind {
  granular_bed,  ///< loose pieces, air may flow through
  slab,          ///< continuous sheet, board, veneer, mat, or tiles laid close
  profile,       ///< continuous strand, stated by its mass per length
  pieces,        ///< separate blocks with gaps
};

/// The product, its form on the belt and what the line file says instead of the database.
struct Product {
  std::string material;  ///< id in the materials database
  ProductKind kind = ProductKind::granular_bed;
  ProductOverrides overrides;
  bool contains_metal = false;   ///< wires, staples, chills, tramp metal expected
  bool combustible = false;      ///< product, dust or deposits burn
  bool dusty = false;            ///< fines that can form a cloud
  bool food = false;             ///< hygiene caution
  std::string flammable_vapour;  ///< name of a solvent given off; empty = none
  bool fumes = false;            ///< toxic or nuisance fumes (resin, rubber, wash)
};

/// How much product lies where. Exactly the members its kind needs are given; flow.h derives the
/// rest or reports the contradiction.
struct Feed {
  std::optional<double> width;            ///< loaded width of the belt [m]
  std::optional<double> depth;            ///< bed depth or sheet thickness [m]
  std::optional<double> bulk_density;     ///< wet, at feed moisture, of the bed or sheet [kg/m3]
  std::optional<double> piece_size;       ///< diameter of one granule [m]
  std::optional<double> void_share;       ///< air between the granules over bed volume, 0..1
  std::optional<double> mass_per_length;  ///< profile: wet mass per length [kg/m]
  std::optional<double> piece_rate;       ///< pieces per second [1/s]
  std::optional<double> piece_mass;       ///< dry mass of one piece [kg]
  std::optional<double> piece_length;     ///< along the belt [m]
  std::optional<double> piece_width;      ///< across the belt [m]
  std::optional<double> piece_height;     ///< [m]
  std::optional<double> lanes;            ///< pieces side by side, 1
  std::optional<double> moisture_spread;  ///< half-width of the feed moisture, dry basis
  std::optional<double> load_spread;      ///< relative half-width of the load, 1
};

/// The belt.
struct Belt {
  std::optional<double> speed;           ///< [m/s]; may follow from the duty
  double width = 0;                      ///< [m]
  double thickness = 3e-3;               ///< [m]
  std::complex<double> eps{2.6, -0.01};  ///< relative permittivity
  Provenance eps_provenance;
  double open_share = 0;  ///< perforation, open area over area, 0..1
};

/// Cross section of a passage the field can travel through.
struct Opening {
  double width = 0;   ///< [m]
  double height = 0;  ///< [m]
};

/// What guards an open end of the tunnel. The reflective part stands next to the cavity.
struct EndTrap {
  std::string name;
  Opening opening;                    ///< clear passage for the product
  double length = 0;                  ///< [m]
  double reflective_attenuation = 0;  ///< sends back [dB]
  double absorbing_attenuation = 0;   ///< takes [dB]
  std::string guaranteed_by;          ///< who guarantees the attenuation with product in place
};

enum class StretchKind { microwave, air, rest, cooling };

/// One piece of the belt, in belt order.
struct Stretch {
  std::string name;
  StretchKind kind = StretchKind::rest;
  double length = 0;  ///< [m]
  std::string air;    ///< name of the air loop that serves it; empty = still room air
  /// Film coefficients of the product's faces [W/(m2 K)]; the belt side sees the air through the
  /// belt's open share for vapour.
  double heat_transfer_top = 0;
  double heat_transfer_belt = 0;

  // Microwave stretches only.
  double width = 0;                  ///< inside, across the belt [m]
  double height = 0;                 ///< inside [m]
  double belt_height_share = 0.5;    ///< height of the belt over inside height
  double wall_resistivity = 7.2e-7;  ///< [ohm m]; default stainless steel 304
  double wall_relative_permeability = 1;
  double wall_roughness_factor = 1;  ///< multiplies the smooth-wall loss
  double mixing = 0;                 ///< s of the angle-class balance: 0 smooth box, 0.05..0.3 ribs
  int launchers = 1;                 ///< openings through which power enters
  std::optional<Opening> passage;    ///< cross section towards its neighbours; default the trap's
};

/// The waveguide run between a generator and its launchers.
struct Run {
  double width = 0;              ///< inside broad side [m]; 0 = no run given
  double height = 0;             ///< inside narrow side [m]
  double length = 0;             ///< [m]
  double resistivity = 2.62e-8;  ///< [ohm m]; default aluminium 3.816e7 S/m
  double excess_factor = 1;      ///< bends, joints, roughness over the smooth-wall loss, >= 1
};

/// A share of a generator's power and the stretch it goes to.
struct FeedBranch {
  std::string stretch;
  double share = 1;  ///< of the generator's output, 0..1
};

/// A generator with its run and the stretches it feeds.
struct Generator {
  std::string name;
  double frequency = 0;                   ///< [Hz]
  double rated = 0;                       ///< output at the flange [W]
  double set_point = 0;                   ///< output now [W], 0..rated
  double minimum_stable = 0;              ///< least output it can hold [W]
  double tube_efficiency = 0;             ///< microwave out over anode power in, 0..1
  double supply_efficiency = 0;           ///< anode power over mains, 0..1
  std::optional<double> reflected_limit;  ///< highest reflected power over output, 0..1
  double launcher_reflection = 0;         ///< power sent back at the launcher itself, 0..1
  Run run;
  std::vector<FeedBranch> feeds;
};

/// How air meets the product along the stretches of a loop.
enum class AirPattern {
  co,       ///< enters with the product
  counter,  ///< enters where the product leaves
  cross,    ///< every place sees the supply state
  through,  ///< up through a granular bed
};

/// Where the heater of an air loop takes its energy from.
enum class HeatSource { none, electric, gas, steam };

/// One air circuit.
struct AirLoop {
  std::string name;
  AirPattern pattern = AirPattern::cross;
  double dry_air_flow = 0;                   ///< [kg dry air/s]
  std::optional<double> supply_temperature;  ///< heater set point [K]; absent = no heater
  double fresh_temperature = 293.15;         ///< [K]
  double fresh_humidity = 0.009;             ///< [kg water/kg dry air]
  double recycle = 0;                        ///< exhaust led back to the mixer, share 0..<1
  std::string takes_from;                    ///< loop whose exhaust is this one's fresh air
  HeatSource heat_source = HeatSource::electric;
  double heater_efficiency = 1;               ///< heat to air over energy bought, 0..1
  double fan_power = 0;                       ///< mains [W]
  double shell_conductance = 0;               ///< loop's duct and hood to the room [W/K]
  std::optional<double> piece_heat_transfer;  ///< film inside a granular bed [W/(m2 K)]
};

/// A named cold surface the loop's exhaust touches.
struct Surface {
  std::string name;
  std::string air;         ///< loop
  double temperature = 0;  ///< [K]
};

/// Limits the line must keep, beyond those of the product card.
struct Limits {
  std::optional<double> product_temperature;          ///< highest anywhere [K]
  std::optional<double> heating_rate;                 ///< highest [K/s]
  std::optional<double> heating_rate_above_moisture;  ///< the heating rate binds above this X
  std::optional<double> drying_rate;                  ///< highest -dX/dt [1/s]
  std::optional<double> moisture_low;                 ///< lowest final, dry basis
  std::optional<double> moisture_high;                ///< highest final, dry basis
  std::optional<double> specific_power;               ///< highest heat per wet mass [W/kg]
  std::optional<double> areal_power;                  ///< highest heat per belt area [W/m2]
  std::optional<double> dew_point_margin;             ///< least, at every named surface [K]
  std::optional<double> overpressure;                 ///< highest inside the product [Pa]
  std::optional<double> cure_high;                    ///< highest degree of cure
  std::optional<double> field_strength;               ///< highest rms field in a cavity [V/m]
};

/// How the power reaches the product.
enum class Balance {
  full,            ///< the cavity balance decides
  constant_share,  ///< screening: a fixed share of launched power; stamped in every result
};

/// Choices of the calculation that the line file may set.
struct SolveChoices {
  Balance balance = Balance::full;
  double load_share = 0.85;  ///< of launched power into the product, for constant_share
};

/// Prices; all optional, none is assumed.
struct Prices {
  std::string currency = "CU";
  std::optional<double> electricity;  ///< [CU/J]
  std::optional<double> fuel;         ///< [CU/J]
};

/// A whole line.
struct Line {
  std::string name;
  std::string note;
  double pressure = 101'325.0;       ///< in the tunnel [Pa]
  double room_temperature = 293.15;  ///< [K]
  double room_humidity = 0.008;      ///< [kg/kg dry air]
  Duty duty;
  Product product;
  Belt belt;
  Feed feed;
  std::vector<Stretch> stretches;
  std::optional<EndTrap> inlet_trap, outlet_trap;
  std::vector<Generator> generators;
  std::vector<AirLoop> air;
  std::vector<Surface> surfaces;
  Limits limits;
  SolveChoices solve;
  Prices prices;
};

}  // namespace lossline
