#pragma once
// Permittivity from a table of points (frequency, moisture, temperature, eps).
//
// Between points: eps' as its cube root and eps'' as its logarithm (linear when any eps'' is 0);
// along moisture a monotone cubic where a temperature has four or more moistures, else straight
// lines; straight lines in temperature and in the logarithm of frequency. No polynomial ever runs
// through all points. Sources: cube root of eps' linear in density and moisture, S. O. Nelson's
// work on grain (from memory); monotone cubic: planner/numerics/monotone_cubic.h.
//
// Edges, each with its mark:
//   drier than the lowest moisture   joined to the dry-solid value where one is given, else held;
//                                    never led to zero, for the loss of the nearly dry product
//                                    decides over-drying. Mark: extrapolated
//   wetter than the highest          held. Mark: extrapolated within 10 % of the span, then clamped
//   hotter or colder                 straight on for 10 K or 10 % of the span, whichever is more,
//                                    then held. Marks: extrapolated, then clamped
//   only one temperature             held; beyond +-10 K marked extrapolated
//   frequency                        within +-5 % of a stored one that one is used; between stored
//                                    ones interpolated; else refused

#include <complex>
#include <optional>
#include <string>
#include <vector>

#include "planner/product/overrides.h"

namespace lossline {

/// What a table carries beside its points.
struct PermittivityTableOptions {
  std::optional<std::complex<double>> dry;  ///< eps of the bone-dry product, joined at X = 0
  Flags origin;                             ///< marks every value of this table carries
  std::string name = "permittivity table";  ///< for messages
};

/// The table. Sorted and transformed once; at() costs well under a microsecond.
class PermittivityTable : public Permittivity {
 public:
  /// Relative distance within which a stored frequency is used as it is.
  static constexpr double frequency_tolerance = 0.05;
  /// Share of the span, and least temperature step [K], within which edges are "extrapolated".
  static constexpr double allowance_share = 0.10;
  static constexpr double allowance_temperature = 10.0;
  /// Share of the span next to a range end that is marked "edge".
  static constexpr double edge_share = 0.02;
  /// Temperatures closer than this [K] are one row of the table.
  static constexpr double temperature_step_min = 0.05;

  /// Sorts and checks the points.
  ///
  ///   points   at least one; all values finite, moisture >= 0, temperature > 0, frequency > 0,
  ///            eps' >= 1, eps'' >= 0 (imaginary part <= 0); no two at the same place. Each
  ///            temperature of a frequency has at least two moistures unless the whole frequency
  ///            has one.
  ///   throws   Error bad_input naming the point
  explicit PermittivityTable(const std::vector<PermittivityPoint>& points,
                             PermittivityTableOptions options = {});

  [[nodiscard]] Valued<std::complex<double>> at(double moisture, double temperature,
                                                double frequency) const override;

  /// The ranges covered, in one line: frequencies, moistures, temperatures.
  [[nodiscard]] std::string ranges() const;
  [[nodiscard]] double moisture_min() const { return moisture_min_; }
  [[nodiscard]] double moisture_max() const { return moisture_max_; }
  [[nodiscard]] double temperature_min() const { return temperature_min_; }
  [[nodiscard]] double temperature_max() const { return temperature_max_; }

 private:
  /// eps at one place in the space of interpolation.
  struct Pair {
    double re = 0, im = 0;
  };
  /// One temperature: knots along moisture with slopes, in the space of interpolation.
  struct Row {
    double temperature = 0;
    std::vector<double> X;
    std::vector<Pair> value, slope;
  };
  /// One frequency: its temperatures, ascending.
  struct Sheet {
    double frequency = 0, log_frequency = 0;
    std::vector<Row> rows;
  };

  [[nodiscard]] Pair transformed(std::complex<double> eps) const;
  [[nodiscard]] Pair along_moisture(const Row& row, double X, Flags& flags) const;
  [[nodiscard]] Pair along_temperature(const Sheet& sheet, double X, double T, Flags& flags) const;

  std::vector<Sheet> sheets_;
  PermittivityTableOptions options_;
  bool log_loss_ = false;
  std::optional<Pair> dry_;
  double moisture_min_ = 0, moisture_max_ = 0, temperature_min_ = 0, temperature_max_ = 0;
};

}  // namespace lossline
