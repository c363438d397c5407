#include "planner/cli/load.h"

#include "materials/sha256.h"
#include "materials/store.h"
#include "planner/base/error.h"
#include "planner/line/topology.h"
#include "planner/linefile/read.h"
#include "planner/product/overrides.h"

namespace lossline::cli {
namespace {

/// The material's card with the overrides; complaints about either stand at their key.
ProductCard card_of(const linefile::LineFile& file, const materials::Store& store) {
  const Product& product = file.line.product;
  auto at = [&](const char* key, const Error& e) {
    return InputError(ErrorKind::bad_line_file, {linefile::locate(file, key, e.what(), "")});
  };
  ProductCard card;
  try {
    card = store.card(product.material);
  } catch (const Error& e) {
    if (e.kind() != ErrorKind::not_found) throw;
    throw at("product.material", e);
  }
  try {
    return with_overrides(std::move(card), product.overrides);
  } catch (const Error& e) {
    throw at("product.permittivity", e);
  }
}

/// What no line can be solved without.
void check_card(const linefile::LineFile& file, const ProductCard& card,
                std::vector<Problem>& problems) {
  if (!card.dry_heat_capacity)
    problems.push_back(linefile::locate(
        file, "product.override.dry_heat_capacity",
        "material '" + card.id + "' has no heat capacity",
        "give one with its evidence, as in dry_heat_capacity = \"1.4 kJ/(kg K)\""));
  if (!card.permittivity && file.line.solve.balance == Balance::full &&
      !file.line.generators.empty())
    problems.push_back(linefile::locate(
        file, "product.permittivity",
        "material '" + card.id + "' has no permittivity and none can be estimated",
        "measure it at the line's frequency and give it in [[product.permittivity.point]]"));
}

}  // namespace

Input load(const Options& options, const std::string& program) {
  std::vector<linefile::Setting> settings;
  for (const std::string& text : options.assignments)
    settings.push_back(linefile::setting_from(text));
  const linefile::LineFile file = linefile::read(options.file, settings);
  const materials::Store store = materials::Store::open(materials::find_base_database(program),
                                                        materials::default_user_database());
  Input input;
  input.card = card_of(file, store);
  std::vector<Problem> problems;
  check_card(file, input.card, problems);
  std::vector<FlowProblem> contradictions;
  input.flow = resolve_flow(file.line, input.card, contradictions);
  for (const FlowProblem& p : contradictions)
    problems.push_back(linefile::locate(file, p.key, p.wrong, p.right));
  for (const TopologyProblem& p : topology(file.line).problems)
    problems.push_back(linefile::locate(file, p.key, p.wrong, p.right));
  if (!problems.empty()) {
    linefile::sort_problems(problems);
    throw InputError(ErrorKind::bad_line_file, std::move(problems));
  }
  std::string text = file.text;
  for (const linefile::Setting& s : settings) text += "\n--set " + s.key + '=' + s.value;
  input.sha256 = materials::sha256(text);
  input.line = file.line;
  return input;
}

}  // namespace lossline::cli
