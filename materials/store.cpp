#include "materials/store.h"

#include <algorithm>
#include <cstdlib>
#include <filesystem>
#include <map>
#include <utility>

#include "materials/card_builder.h"
#include "materials/goldens.h"
#include "planner/base/error.h"
#include "planner/base/nearest.h"

namespace lossline::materials {
namespace {

namespace fs = std::filesystem;

std::optional<std::string> environment(const char* name) {
  const char* value = std::getenv(name);  // NOLINT(concurrency-mt-unsafe): read at start-up only
  if (value == nullptr || *value == '\0') return std::nullopt;
  return value;
}

std::optional<MaterialSummary> read_material(const Database& database, const std::string& id) {
  Statement row =
      database.prepare("SELECT name, family, form, status FROM material WHERE material_id = ?1");
  row.bind(1, id);
  if (!row.step()) return std::nullopt;
  MaterialSummary out;
  out.id = id;
  out.name = row.text(0);
  out.family = row.text(1);
  out.form = row.text(2);
  out.status = row.text(3);
  return out;
}

std::vector<std::string> ids_of(const Database& database) {
  Statement rows = database.prepare("SELECT material_id FROM material WHERE status <> 'retired'");
  std::vector<std::string> out;
  while (rows.step()) out.push_back(rows.text(0));
  return out;
}

/// Worst grade of the properties that are present; '-' when none is.
char worst(std::initializer_list<const std::optional<Property>*> properties) {
  char grade = '-';
  for (const auto* property : properties)
    if (property->has_value()) grade = std::max(grade, (*property)->provenance.grade);
  return grade;
}

void put_grades(MaterialSummary& out, const ProductCard& card) {
  if (card.permittivity) out.permittivity = card.permittivity_provenance.grade;
  if (card.sorption) out.sorption = card.sorption_provenance.grade;
  if (card.cure) out.cure = card.cure_provenance.grade;
  out.heat = worst({&card.dry_heat_capacity});
  out.density = worst({&card.dry_bulk_density, &card.dry_piece_density, &card.solid_density});
  out.transport = worst({&card.conductivity, &card.diffusivity, &card.permeability});
  for (const ProductLimit& limit : card.limits)
    out.limits = std::max(out.limits, limit.provenance.grade);
}

[[noreturn]] void unknown_material(const std::string& id, const std::vector<std::string>& known) {
  const std::string near = nearest(id, known);
  throw Error(ErrorKind::not_found, "material '" + id + "' is not in the database" +
                                        (near.empty() ? "; see 'lossline materials list'"
                                                      : "; did you mean '" + near + "'?"));
}

}  // namespace

Store::Store(Database base, std::optional<Database> user)
    : base_(std::move(base)), user_(std::move(user)) {}

Store Store::open(const std::string& base_path, const std::string& user_path) {
  Database base = Database::open_read_only(base_path);
  std::optional<Database> user;
  std::error_code ignored;
  if (!user_path.empty() && fs::exists(user_path, ignored)) user = Database::open_user(user_path);
  return {std::move(base), std::move(user)};
}

std::vector<DatasetRecord> Store::datasets(const std::string& id) const {
  std::vector<DatasetRecord> out = read_datasets(base_, id);
  if (user_) {
    std::vector<DatasetRecord> own = read_datasets(*user_, id);
    out.insert(out.end(), std::make_move_iterator(own.begin()), std::make_move_iterator(own.end()));
  }
  std::stable_sort(out.begin(), out.end(), [](const DatasetRecord& a, const DatasetRecord& b) {
    return a.priority != b.priority ? a.priority < b.priority
                                    : a.provenance.grade < b.provenance.grade;
  });
  return out;
}

ProductCard Store::card(const std::string& id) const {
  std::optional<MaterialSummary> summary = read_material(base_, id);
  if (!summary && user_) summary = read_material(*user_, id);
  if (!summary) {
    std::vector<std::string> known = ids_of(base_);
    if (user_)
      for (std::string& own : ids_of(*user_)) known.push_back(std::move(own));
    std::sort(known.begin(), known.end());
    known.erase(std::unique(known.begin(), known.end()), known.end());
    unknown_material(id, known);
  }
  CardRows rows{id,           summary->name,          summary->family,
                datasets(id), read_limits(base_, id), read_composition(base_, id)};
  if (user_)
    for (ProductLimit& limit : read_limits(*user_, id)) rows.limits.push_back(std::move(limit));
  return build_card(std::move(rows));
}

std::vector<MaterialSummary> Store::list() const {
  std::map<std::string, MaterialSummary> found;
  for (const std::string& id : ids_of(base_)) found[id] = *read_material(base_, id);
  if (user_)
    for (const std::string& id : ids_of(*user_)) {
      if (!found.contains(id)) found[id] = *read_material(*user_, id);
      found[id].user_data = true;
    }
  std::vector<MaterialSummary> out;
  for (auto& [id, summary] : found) {
    put_grades(summary, card(id));
    out.push_back(std::move(summary));
  }
  return out;
}

MaterialDescription Store::describe(const std::string& id) const {
  MaterialDescription out;
  out.card = card(id);
  const Database& home = read_material(base_, id) ? base_ : *user_;
  out.summary = *read_material(home, id);
  put_grades(out.summary, out.card);
  out.summary.user_data = user_ && read_material(*user_, id);
  Statement row = home.prepare("SELECT description, needs FROM material WHERE material_id = ?1");
  row.bind(1, id);
  if (row.step()) {
    out.description = row.text(0);
    out.needs = row.text(1);
  }
  Statement aliases =
      home.prepare("SELECT alias FROM material_alias WHERE material_id = ?1 ORDER BY alias");
  aliases.bind(1, id);
  while (aliases.step()) out.aliases.push_back(aliases.text(0));
  out.datasets = datasets(id);
  std::stable_sort(
      out.datasets.begin(), out.datasets.end(),
      [](const DatasetRecord& a, const DatasetRecord& b) { return a.quantity < b.quantity; });
  return out;
}

std::string find_base_database(const std::string& executable_path) {
  std::vector<fs::path> places;
  if (const auto named = environment("LOSSLINE_MATERIALS")) {
    places.emplace_back(*named);
  } else {
    std::error_code ignored;
    const fs::path program = fs::weakly_canonical(executable_path, ignored);
    fs::path folder = program.parent_path();
    places.push_back(folder.parent_path() / "share" / "lossline" / "materials.db");
    for (int up = 0; up < 5 && !folder.empty(); ++up, folder = folder.parent_path())
      places.push_back(folder / "materials" / "materials.db");
  }
  std::string looked;
  for (const fs::path& place : places) {
    std::error_code ignored;
    if (fs::is_regular_file(place, ignored)) return place.string();
    looked += (looked.empty() ? "" : ", ") + place.string();
  }
  throw Error(ErrorKind::not_found, "materials database not found; looked at " + looked +
                                        "; set LOSSLINE_MATERIALS to its path");
}

std::string default_user_database() {
  if (const auto named = environment("LOSSLINE_USER_MATERIALS")) return *named;
  fs::path home;
  if (const auto data = environment("XDG_DATA_HOME"))
    home = *data;
  else if (const auto user = environment("HOME"))
    home = fs::path(*user) / ".local" / "share";
  if (home.empty()) return {};
  return (home / "lossline" / "user-materials.db").string();
}

}  // namespace lossline::materials
