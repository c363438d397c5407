#pragma once
// The kinds of quantity that line files, the command line and tables hold. Two kinds may share a
// dimension: they differ in the unit they are shown in and in the example a message gives.

#include "planner/base/quantity.h"

namespace lossline::quantity {

using Form = QuantityForm;

// Geometry, time, motion.
inline constexpr QuantityKind length{"a length", "2.4 m", dimension(0, 1), "m", "ft"};
inline constexpr QuantityKind small_length{"a length", "60 mm", dimension(0, 1), "mm", "in"};
inline constexpr QuantityKind time{"a time", "90 s", dimension(0, 0, 1), "s", "s"};
inline constexpr QuantityKind minutes{"a time", "15 min", dimension(0, 0, 1), "min", "min"};
inline constexpr QuantityKind hours{"a time", "6000 h", dimension(0, 0, 1), "h", "h"};
inline constexpr QuantityKind speed{"a speed", "2.4 m/min", dimension(0, 1, -1), "m/min", "ft/min"};
inline constexpr QuantityKind rate{"a rate", "40 1/h", dimension(0, 0, -1), "1/h", "1/h"};
inline constexpr QuantityKind frequency{"a frequency", "2450 MHz", dimension(0, 0, -1), "MHz",
                                        "MHz"};
inline constexpr QuantityKind angle{"an angle", "30 deg", dimension(0, 0, 0, 0, 0, 0, 0, 0, 1),
                                    "deg", "deg"};

// Mass and flow.
inline constexpr QuantityKind mass{"a mass", "6 kg", dimension(1), "kg", "lb"};
inline constexpr QuantityKind mass_per_length{"a mass per length", "0.75 kg/m", dimension(1, -1),
                                              "kg/m", "lb/ft"};
inline constexpr QuantityKind mass_flow{"a mass flow", "1.8 t/h", dimension(1, 0, -1), "kg/h",
                                        "lb/h"};
inline constexpr QuantityKind dry_air_flow{"a flow of dry air", "5500 kg/h", dimension(1, 0, -1),
                                           "kg/h", "lb/h"};
inline constexpr QuantityKind volume_flow{"a volume flow", "1800 m3/h", dimension(0, 3, -1), "m3/h",
                                          "ft3/min"};
inline constexpr QuantityKind density{"a density", "400 kg/m3", dimension(1, -3), "kg/m3",
                                      "lb/ft3"};
inline constexpr QuantityKind pressure{"a pressure", "101.3 kPa", dimension(1, -1, -2), "kPa",
                                       "psi"};
inline constexpr QuantityKind permeability{"a permeability", "1e-13 m2", dimension(0, 2), "m2",
                                           "m2"};
inline constexpr QuantityKind diffusivity{"a diffusivity", "1.5e-9 m2/s", dimension(0, 2, -1),
                                          "m2/s", "ft2/h"};

// Temperature and heat.
inline constexpr QuantityKind temperature{"a temperature", "80 degC", dimension(0, 0, 0, 1),
                                          "degC",          "degF",    Form::temperature};
inline constexpr QuantityKind temperature_difference{
    "a temperature difference",  "10 K", dimension(0, 0, 0, 1), "K", "degF diff",
    Form::temperature_difference};
inline constexpr QuantityKind heating_rate{"a heating rate", "1.5 K/min", dimension(0, 0, -1, 1),
                                           "K/min", "degF/min"};
inline constexpr QuantityKind power{"a power", "75 kW", dimension(1, 2, -3), "kW", "kW"};
inline constexpr QuantityKind areal_power{"a power per area", "20 kW/m2", dimension(1, 0, -3),
                                          "kW/m2", "kW/ft2"};
inline constexpr QuantityKind specific_power{"a power per mass", "600 W/kg", dimension(0, 2, -3),
                                             "W/kg", "W/lb"};
inline constexpr QuantityKind specific_energy{"an energy per mass", "1.2 kWh/kg",
                                              dimension(0, 2, -2), "kWh/kg", "kWh/lb"};
inline constexpr QuantityKind specific_heat{"a heat per mass", "350 kJ/kg", dimension(0, 2, -2),
                                            "kJ/kg", "BTU/lb"};
inline constexpr QuantityKind heat_capacity{"a heat capacity", "1.6 kJ/(kg K)",
                                            dimension(0, 2, -2, -1), "kJ/(kg K)", "BTU/(lb degF)"};
inline constexpr QuantityKind heat_capacity_slope{"a change of heat capacity", "4 J/(kg K2)",
                                                  dimension(0, 2, -2, -2), "J/(kg K2)",
                                                  "BTU/(lb degF2)"};
inline constexpr QuantityKind conductivity{"a thermal conductivity", "0.15 W/(m K)",
                                           dimension(1, 1, -3, -1), "W/(m K)", "BTU/(h ft degF)"};
inline constexpr QuantityKind heat_transfer{"a heat-transfer coefficient", "25 W/(m2 K)",
                                            dimension(1, 0, -3, -1), "W/(m2 K)",
                                            "BTU/(h ft2 degF)"};
inline constexpr QuantityKind conductance{"a heat conductance", "60 W/K", dimension(1, 2, -3, -1),
                                          "W/K", "BTU/(h degF)"};
inline constexpr QuantityKind activation_energy{"an activation energy", "95 kJ/mol",
                                                dimension(1, 2, -2, 0, 0, -1), "kJ/mol", "kJ/mol"};

// Moisture and shares.
inline constexpr QuantityKind moisture{"a moisture", "25 % wb", dimension(0),
                                       "% db",       "% db",    Form::moisture};
inline constexpr QuantityKind moisture_difference{
    "a moisture difference", "0.9 % db", dimension(0), "% db", "% db", Form::moisture_difference};
inline constexpr QuantityKind drying_rate{"a drying rate", "0.4 %/min", dimension(0, 0, -1),
                                          "%/min", "%/min"};
inline constexpr QuantityKind humidity{
    "a humidity ratio", "0.009 kg/kg", dimension(0), "kg/kg", "lb/lb", Form::humidity};
inline constexpr QuantityKind share{"a share", "40 %", dimension(0), "%", "%", Form::share};
inline constexpr QuantityKind number{"a number", "2.6", dimension(0), "", "", Form::number};
inline constexpr QuantityKind count{"a count", "2", dimension(0), "", "", Form::count};

// Electricity, money, emissions.
inline constexpr QuantityKind resistivity{"a resistivity", "7.2e-7 ohm m",
                                          dimension(1, 3, -3, 0, -2), "ohm m", "ohm m"};
inline constexpr QuantityKind field_strength{"a field strength", "30 kV/m",
                                             dimension(1, 1, -3, 0, -1), "kV/m", "kV/m"};
inline constexpr QuantityKind attenuation{"an attenuation", "30 dB",
                                          dimension(0, 0, 0, 0, 0, 0, 0, 1), "dB", "dB"};
inline constexpr QuantityKind energy_price{"an energy price", "140 CU/MWh",
                                           dimension(-1, -2, 2, 0, 0, 0, 1), "CU/MWh", "CU/MWh"};
inline constexpr QuantityKind carbon_intensity{"an emission per energy", "0.35 kg/kWh",
                                               dimension(0, -2, 2), "kg/kWh", "lb/kWh"};

}  // namespace lossline::quantity
