#pragma once
// The materials store: the shipped database and, where there is one, the user's own beside it.
// User rows out-rank shipped ones (their priority is below 100) and never change them.

#include <memory>
#include <optional>
#include <string>
#include <vector>

#include "materials/database.h"
#include "materials/record.h"
#include "planner/product/card.h"

namespace lossline::materials {

/// One line of the list of materials.
struct MaterialSummary {
  std::string id, name, family, form, status;
  bool user_data = false;  ///< at least one row of the user's own
  /// Grade of what the card uses, '-' where it has nothing.
  char permittivity = '-', heat = '-', sorption = '-', density = '-', transport = '-', cure = '-',
       limits = '-';
};

/// Everything stored about one material, for reading.
struct MaterialDescription {
  MaterialSummary summary;
  std::string description;
  std::string needs;  ///< the measurement that would lift this card; empty when none is named
  std::vector<std::string> aliases;
  std::vector<DatasetRecord> datasets;  ///< best first within each quantity
  ProductCard card;
};

/// Read access; const members may be called from any thread.
class Store {
 public:
  /// Opens the shipped database, and the user database when its file exists.
  ///
  ///   base_path  of the shipped database
  ///   user_path  of the user database; empty for none
  ///   throws     Error database with one sentence when a file cannot be used
  static Store open(const std::string& base_path, const std::string& user_path = {});

  /// All materials, sorted by id.
  [[nodiscard]] std::vector<MaterialSummary> list() const;
  /// The product card; throws Error not_found naming the nearest id for an unknown material.
  [[nodiscard]] ProductCard card(const std::string& id) const;
  /// Everything about one material; throws as card().
  [[nodiscard]] MaterialDescription describe(const std::string& id) const;

  [[nodiscard]] const Database& base() const { return base_; }
  /// The user database, or null.
  [[nodiscard]] const Database* user() const { return user_ ? &*user_ : nullptr; }

 private:
  Store(Database base, std::optional<Database> user);
  [[nodiscard]] std::vector<DatasetRecord> datasets(const std::string& id) const;

  Database base_;
  std::optional<Database> user_;
};

/// Where the shipped database is: $LOSSLINE_MATERIALS, else ../share/lossline/materials.db beside
/// the program, else materials/materials.db in a folder above it (a build tree).
///
///   executable_path  of the running program, as from /proc/self/exe or argv[0]
///   returns          a path that exists
///   throws           Error not_found naming every place that was looked at
[[nodiscard]] std::string find_base_database(const std::string& executable_path);

/// Where the user database is, whether it exists or not: $LOSSLINE_USER_MATERIALS, else
/// $XDG_DATA_HOME/lossline/user-materials.db, else ~/.local/share/lossline/user-materials.db;
/// empty when there is no home.
[[nodiscard]] std::string default_user_database();

}  // namespace lossline::materials
