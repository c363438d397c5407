#pragma once
// Reads a measured permittivity series from CSV, the one format for authored data and for the
// user's own measurements.
//
//   # material=sand_core; of_phase=bulk; moisture_basis=wet; bulk_density=1520 kg/m3
//   # instrument=cavity perturbation; calibrated=2026-02-03; operator=AB
//   M,T,f,eps_re,eps_im
//   %,degC,MHz,1,1
//   ...data rows...
//
// Lines that begin with '#' are metadata (key=value, separated by ';'). Columns: X (dry basis) or
// M (with moisture_basis=wet or dry), T, f, eps_re, and exactly one of eps_im, tan_delta or depth
// (penetration depth, with penetration_depth=power or field); u_re and u_im may follow. Semicolons
// between cells are recognised; a decimal comma must be announced by decimal=comma. Nothing is
// guessed: what could be read two ways is refused with the question to answer.

#include <map>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace lossline::materials {

/// One accepted row, SI.
struct SeriesPoint {
  int line = 0;
  double moisture = 0;     ///< dry basis
  double temperature = 0;  ///< [K]
  double frequency = 0;    ///< [Hz]
  double eps_re = 1, eps_im = 0;
  std::optional<double> u_re, u_im;
  std::string printed;  ///< the row as it stands in the file
};

/// One row that was not taken.
struct RejectedRow {
  int line = 0;
  std::string reason;
};

/// A series with its report.
struct Series {
  std::map<std::string, std::string> metadata;
  std::vector<SeriesPoint> points;  ///< sorted by frequency, temperature, moisture
  std::vector<RejectedRow> rejected;
  bool basis_converted = false;  ///< the file states wet basis
  std::string reading;           ///< how the file was read: delimiter, units, loss column

  /// A metadata value, or empty.
  [[nodiscard]] std::string meta(const std::string& key) const;
};

/// Ranges a row must lie in to be believed; a value outside is usually a unit mistake.
inline constexpr double series_T_min = 200, series_T_max = 1500;  ///< [K]
inline constexpr double series_f_min = 1e7, series_f_max = 3e10;  ///< [Hz]
inline constexpr double series_eps_re_max = 300, series_eps_im_max = 1000;
inline constexpr double series_X_max = 30;  ///< dry basis

/// Loss factor from the penetration depth.
///
///   eps_re     eps' >= 1
///   depth      depth at which the power has fallen to 1/e [m], > 0
///   frequency  [Hz]
///   returns    eps'', exact inverse of Dp = c0 / (4 pi f Im sqrt(eps' - j eps''))
[[nodiscard]] double loss_from_depth(double eps_re, double depth, double frequency);

/// Reads a series.
///
///   text       content of the file
///   file_name  for messages
///   returns    accepted and rejected rows; there may be no accepted row
///   throws     InputError bad_input when the head of the file cannot be understood
[[nodiscard]] Series read_series(std::string_view text, const std::string& file_name);

}  // namespace lossline::materials
