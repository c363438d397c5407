#pragma once
// The range in which each input of a line is physically possible. Code that reads, checks or edits
// an input shares these constants.
//
// Bounds without a reason of physics are gates of plausibility chosen for this program (common
// practice): wide enough for any line, narrow enough to catch a slip of the unit.

#include "planner/base/quantity_kinds.h"

namespace lossline {

/// Range of one input; both ends are allowed.
struct Range {
  const char* name;          ///< "belt speed"
  double low, high;          ///< SI
  const QuantityKind& kind;  ///< how it is written, with its unit
  const char* reason;        ///< why nothing outside is possible

  /// NaN is never inside.
  [[nodiscard]] constexpr bool holds(double value) const { return value >= low && value <= high; }
};

namespace range {

namespace q = quantity;

inline constexpr double hour = 3600, minute = 60, zero_C = 273.15, year = 8784 * hour;
inline constexpr const char* share_reason = "a share lies between nothing and all";
inline constexpr const char* temperature_reason = "no such line works so cold or so hot";
inline constexpr const char* slip_reason = "check the number and its unit";
inline constexpr const char* size_reason = "a size is above zero";
inline constexpr const char* efficiency_reason = "nothing gives out more than it takes in";

// The line and its room.
inline constexpr Range pressure{"pressure in the tunnel", 50e3, 200e3, q::pressure,
                                "tunnels are open at the ends and work near room pressure"};
inline constexpr Range room_temperature{"room temperature", zero_C - 40, zero_C + 60,
                                        q::temperature, temperature_reason};
inline constexpr Range air_humidity{"humidity ratio", 0, 1, q::humidity,
                                    "air cannot hold less than nothing or mostly vapour"};

// Duty.
inline constexpr Range mass_flow{"rate", 1e-3 / hour, 1e6 / hour, q::mass_flow,
                                 "a rate is above zero"};
inline constexpr Range moisture{"moisture", 0, 20, q::moisture,
                                "a product cannot hold less than no water"};
inline constexpr Range product_temperature{"product temperature", zero_C - 40, zero_C + 400,
                                           q::temperature, temperature_reason};
inline constexpr Range cure{"degree of cure", 0, 1, q::share,
                            "the degree of cure runs from nothing to complete"};
inline constexpr Range moisture_difference{"moisture difference", 0, 1, q::moisture_difference,
                                           "a tolerance is not negative"};
inline constexpr Range yearly_hours{"hours per year", hour, year, q::hours,
                                    "a year has 8784 hours at most"};

// Product. Heat capacities of dry solids run from about 0.4 kJ/(kg K) for heavy minerals to about
// 2 kJ/(kg K) for organic matter (from memory); the gate is half and twice that.
inline constexpr Range heat_capacity{"heat capacity", 200, 4200, q::heat_capacity,
                                     "heating a solid always takes heat"};
inline constexpr Range heat_capacity_slope{"change of heat capacity", -20, 50,
                                           q::heat_capacity_slope, slip_reason};
inline constexpr Range density{"density", 5, 9000, q::density, "a product has mass"};
inline constexpr Range shrinkage{"shrinkage coefficient", 0, 10, q::number,
                                 "a product does not shrink by taking up water"};
inline constexpr Range conductivity{"thermal conductivity", 0.01, 100, q::conductivity,
                                    "heat always spreads; still air conducts 0.026 W/(m K)"};
inline constexpr Range conductivity_slope{"change of conductivity with moisture", 0, 100,
                                          q::conductivity, slip_reason};
inline constexpr Range diffusivity{"diffusivity", 1e-16, 1e-5, q::diffusivity, slip_reason};
inline constexpr Range activation_energy{"activation energy", 0, 500e3, q::activation_energy,
                                         "reactions do not slow down by heating"};
inline constexpr Range scale_moisture{"moisture", 1e-6, 20, q::moisture, "it is above zero"};
inline constexpr Range permeability{"permeability", 1e-24, 1e-6, q::permeability, slip_reason};
inline constexpr Range vapour_factor{"vapour factor", 0, 1, q::share,
                                     "vapour moves in pores no faster than in free air"};
inline constexpr Range heat_of_reaction{"heat of reaction", -5e6, 5e6, q::specific_heat,
                                        slip_reason};
inline constexpr Range oswin_exponent{"exponent", 0.01, 3, q::number, slip_reason};
inline constexpr Range sorption_temperature{"reference temperature", 200, zero_C + 200,
                                            q::temperature, "isotherms hold for liquid water"};
inline constexpr Range sorption_heat{"net heat of sorption", 0, 5e6, q::specific_heat,
                                     "bound water takes more heat than free water, not less"};
inline constexpr Range cure_time{"time to 90 %", 0.01, 1e7, q::time, "a reaction takes time"};
inline constexpr Range cure_temperature{"reference temperature", 250, 700, q::temperature,
                                        temperature_reason};
inline constexpr Range eps_real{"eps_real", 1, 300, q::number,
                                "no matter stores less field energy than vacuum"};
inline constexpr Range loss_factor{"loss factor", 0, 1000, q::number,
                                   "a passive product takes power and gives none"};

// Belt and feed.
inline constexpr Range belt_speed{"belt speed", 1e-6, 10, q::speed, "a belt moves forward"};
inline constexpr Range belt_width{"width", 5e-3, 10, q::length, size_reason};
inline constexpr Range belt_thickness{"belt thickness", 1e-5, 0.1, q::small_length, size_reason};
inline constexpr Range open_share{"open share", 0, 0.95, q::share,
                                  "a belt that carries product is not all holes"};
inline constexpr Range depth{"depth", 1e-4, 2, q::small_length, size_reason};
inline constexpr Range piece{"piece size", 1e-5, 10, q::small_length, size_reason};
inline constexpr Range void_share{"void share", 0.01, 0.98, q::share,
                                  "pieces neither fill all the space nor none of it"};
inline constexpr Range mass_per_length{"mass per length", 1e-5, 1e3, q::mass_per_length,
                                       "a product has mass"};
inline constexpr Range piece_rate{"piece rate", 1e-2 / hour, 1e3, q::rate, "a rate is above zero"};
inline constexpr Range piece_mass{"piece mass", 1e-6, 1e4, q::mass, "a product has mass"};
inline constexpr Range lanes{"lanes", 1, 1000, q::count, "there is at least one lane"};
inline constexpr Range load_spread{"load spread", 0, 0.95, q::share,
                                   "the least loaded strip still carries something"};

// Stretches and their ends.
inline constexpr Range stretch_length{"stretch length", 0.01, 500, q::length,
                                      "a stretch takes up belt"};
inline constexpr Range heat_transfer{"heat-transfer coefficient", 0, 5000, q::heat_transfer,
                                     "heat flows from hot to cold"};
inline constexpr Range cavity_size{"inside size", 0.03, 10, q::length, size_reason};
inline constexpr Range belt_height_share{"height of the belt over the inside height", 0.01, 0.98,
                                         q::share, "the belt runs inside the cavity"};
// Silver, the best conductor, has 1.6e-8 ohm m at 20 degC (from memory).
inline constexpr Range resistivity{"resistivity", 1.5e-8, 1e-4, q::resistivity,
                                   "no metal conducts better than silver"};
inline constexpr Range relative_permeability{"relative permeability", 1, 1e4, q::number,
                                             slip_reason};
inline constexpr Range roughness_factor{"roughness factor", 1, 10, q::number,
                                        "a rough wall loses no less than a smooth one"};
inline constexpr Range mixing{"mixing", 0, 1, q::number,
                              "0 is a smooth box and 1 a full mix at every reflection"};
inline constexpr Range launchers{"launchers", 1, 100, q::count,
                                 "power enters through at least one opening"};
inline constexpr Range opening{"opening", 1e-3, 10, q::small_length, size_reason};
inline constexpr Range trap_length{"trap length", 0.01, 50, q::length, size_reason};
inline constexpr Range attenuation{"attenuation", 0, 150, q::attenuation,
                                   "a trap does not amplify"};

// Generators. Microwaves begin at 300 MHz (common definition).
inline constexpr Range frequency{"frequency", 300e6, 30e9, q::frequency,
                                 "microwaves for heating lie in that range"};
inline constexpr Range power{"power", 0, 10e6, q::power, "a generator gives power and takes none"};
inline constexpr Range rated_power{"rated power", 1, 10e6, q::power, "a generator gives power"};
inline constexpr Range efficiency{"efficiency", 0.01, 1, q::share, efficiency_reason};
inline constexpr Range reflection{"reflected share", 0, 1, q::share,
                                  "no more comes back than went in"};
inline constexpr Range launcher_reflection{"launcher reflection", 0, 0.99, q::share,
                                           "some power must pass the launcher"};
inline constexpr Range feed_share{"share of the output", 0, 1, q::share, share_reason};
inline constexpr Range run_side{"inside of the run", 1e-3, 2, q::small_length, size_reason};
inline constexpr Range run_length{"run length", 0, 500, q::length, "a length is not negative"};
inline constexpr Range run_excess{"excess factor", 1, 100, q::number,
                                  "a real run loses no less than a smooth one"};

// Air.
inline constexpr Range air_flow{"flow of dry air", 1e-2 / hour, 1e6 / hour, q::dry_air_flow,
                                "a loop moves air"};
inline constexpr Range air_temperature{"air temperature", zero_C - 40, zero_C + 500, q::temperature,
                                       temperature_reason};
inline constexpr Range recycle{"recycled share", 0, 0.99, q::share,
                               "water must leave the loop with some exhaust"};
inline constexpr Range fan_power{"fan power", 0, 10e6, q::power, "a fan takes power"};
inline constexpr Range conductance{"heat conductance", 0, 1e5, q::conductance,
                                   "heat flows from hot to cold"};
inline constexpr Range piece_film{"heat-transfer coefficient", 0.1, 5000, q::heat_transfer,
                                  "moving air always exchanges heat"};

// Limits, choices, prices.
inline constexpr Range limit_temperature{"temperature limit", zero_C - 40, zero_C + 1000,
                                         q::temperature, temperature_reason};
inline constexpr Range heating_rate{"heating rate", 1e-3 / minute, 100, q::heating_rate,
                                    "a limit of zero forbids all heating"};
inline constexpr Range drying_rate{"drying rate", 1e-9, 1, q::drying_rate,
                                   "a limit of zero forbids all drying"};
inline constexpr Range specific_power{"power per mass", 1e-3, 1e7, q::specific_power,
                                      "a limit of zero forbids all heating"};
inline constexpr Range areal_power{"power per area", 1, 1e8, q::areal_power,
                                   "a limit of zero forbids all heating"};
inline constexpr Range dew_point_margin{"dew-point margin", 0, 100, q::temperature_difference,
                                        "a margin is not negative"};
inline constexpr Range overpressure{"overpressure", 1, 1e8, q::pressure,
                                    "a limit of zero forbids all vapour"};
// Dry air at 1 atm breaks down near 3 MV/m peak (from memory).
inline constexpr Range field_strength{"field strength", 1, 3e6, q::field_strength,
                                      "air breaks down beyond"};
inline constexpr Range load_share{"load share", 0.01, 1, q::share, share_reason};
inline constexpr Range energy_price{"energy price", 0, 1, q::energy_price,
                                    "a price is not negative"};

}  // namespace range
}  // namespace lossline
