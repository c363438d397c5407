#pragma once
// Cautions a planned line raises. Lossline plans and estimates; it never certifies. Every caution
// names the document that decides, and none can be switched off.
//
// The wording is our own; thresholds marked "own choice" come from no standard.

#include <string>
#include <vector>

#include "planner/line/line.h"
#include "planner/march/solution.h"
#include "planner/product/card.h"
#include "planner/verdict/margins.h"

namespace lossline::verdict {

/// One caution.
struct Caution {
  std::string id;        ///< "C02b"; stable, part of the JSON answer
  std::string title;     ///< a few words
  std::string text;      ///< what to do about it, with this line's numbers
  std::string where;     ///< trap, stretch, generator; empty = whole line
  std::string document;  ///< that decides; always "verify the edition and national law"
  bool always = false;   ///< raised for every line with power, whatever its numbers
};

/// Below this dew-point distance condensation is worth a caution [K]. Common practice.
inline constexpr double condensation_distance = 10.0;
/// Share of an opening's height from which the product itself may carry power out. Own choice.
inline constexpr double filled_opening_share = 1.0 / 3;
/// Share of launched power in the product below which a load counts as thin. Own choice.
inline constexpr double thin_load_share = 0.5;
/// Surfaces above this burn within about a second of contact on bare metal [K]; value from memory
/// of ISO 13732-1, 65 degC.
inline constexpr double hot_surface = 338.15;

/// Every caution the line raises, in order of id; the compact always-on ones last.
[[nodiscard]] std::vector<Caution> cautions(const Line& line, const ProductCard& card,
                                            const Solution& solution, const Margins& margins);

/// Cautions that need information a line file does not hold, each as "C18 inert atmosphere: ...".
[[nodiscard]] std::vector<std::string> not_assessed();

}  // namespace lossline::verdict
