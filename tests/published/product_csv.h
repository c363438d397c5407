#pragma once
// Reads the comma-separated tables in tests/published/data: a comment line, a heading, rows.

#include <fstream>
#include <sstream>
#include <string>
#include <vector>

namespace lossline::test {

/// The rows below the heading, split at commas.
inline std::vector<std::vector<std::string>> table(const std::string& name) {
  std::ifstream in(std::string(LOSSLINE_SOURCE_DIR) + "/tests/published/data/" + name);
  std::vector<std::vector<std::string>> rows;
  bool heading = true;
  for (std::string line; std::getline(in, line);) {
    if (line.empty() || line[0] == '#') continue;
    if (heading) {
      heading = false;
      continue;
    }
    std::vector<std::string> row;
    std::stringstream cells(line);
    for (std::string cell; std::getline(cells, cell, ',');) row.push_back(cell);
    rows.push_back(row);
  }
  return rows;
}

/// The numbers in a cell such as "k1=0.01 k2=0.1 m=0.8": whatever follows each "=".
inline std::vector<double> parameters(const std::string& cell) {
  std::vector<double> out;
  for (std::size_t at = cell.find('='); at != std::string::npos; at = cell.find('=', at + 1))
    out.push_back(std::stod(cell.substr(at + 1)));
  return out;
}

}  // namespace lossline::test
