#pragma once
// The hand-made solution of tests/verdict with its verdict, ready to print.

#include "planner/report/page.h"
#include "tests/verdict/sample_solution.h"

namespace lossline::sample {

struct WholePage {
  Line line = solved_line();
  ProductCard card;
  Solution solution = solved();
  verdict::Margins margins;
  std::vector<verdict::Caution> cautions;

  report::Page page() {
    margins = verdict::margins(line, card, solution);
    cautions = verdict::cautions(line, card, solution, margins);
    return {line, solution, margins, cautions, "sample.toml", std::string(64, 'a')};
  }
};

}  // namespace lossline::sample
