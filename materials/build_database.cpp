#include "materials/build_database.h"

#include <filesystem>
#include <fstream>
#include <map>
#include <sstream>

#include "materials/database.h"
#include "materials/goldens.h"
#include "materials/insert.h"
#include "materials/models.h"
#include "materials/sha256.h"
#include "materials/sheets.h"

namespace lossline::materials {
namespace {

namespace fs = std::filesystem;

std::string read_text(const std::string& path) {
  std::ifstream in(path, std::ios::binary);
  if (!in) throw Error(ErrorKind::not_found, "'" + path + "' not found");
  std::ostringstream text;
  text << in.rdbuf();
  return text.str();
}

/// Failed check values and models that cannot be built, as problems with file and line.
std::vector<Problem> model_faults(const Database& database, const Sheets& sheets) {
  std::map<std::string, Place> places;
  std::vector<Problem> problems;
  for (const SheetMaterial& m : sheets.materials) {
    for (const SheetDataset& d : m.datasets) {
      places[d.id] = d.place;
      const DatasetRecord record = read_dataset(database, d.id);
      try {
        if (d.quantity == "eps") (void)permittivity_of(record);
        if (d.quantity == "isotherm") (void)product::Sorption(isotherm_of(record));
        if (d.quantity == "cure") product::check(cure_of(record));
      } catch (const Error& error) {
        problems.push_back({d.place.file, d.place.line, 0, "dataset", error.what(),
                            "parameters the form can use"});
      }
    }
  }
  for (const GoldenResult& golden : run_goldens(database)) {
    if (golden.passed) continue;
    const Place place = places[golden.dataset];
    problems.push_back({place.file, place.line, 0, golden.id, golden.state + ": " + golden.failure,
                        "the check value, or a data set that meets it"});
  }
  return problems;
}

void write_meta(const Database& database, const Sheets& sheets, const std::string& schema) {
  const auto put = [&](const std::string& key, const std::string& value) {
    database.prepare("INSERT INTO meta VALUES(?1,?2)").bind(1, key).bind(2, value).run();
  };
  put("schema_version", std::to_string(schema_version));
  put("input:schema.sql", sha256(schema));
  std::string all;
  for (const auto& [path, digest] : sheets.inputs) {
    put("input:" + path, digest);
    all.append(path).append(" ").append(digest).append("\n");
  }
  put("inputs_sha256", sha256(all + sha256(schema)));
}

}  // namespace

BuildReport build_database(const std::string& data_folder, const std::string& schema_file,
                           const std::string& output) {
  const std::string schema = read_text(schema_file);
  const Sheets sheets = read_sheets(data_folder);
  if (std::vector<Problem> faults = faults_of(sheets); !faults.empty())
    throw InputError(ErrorKind::bad_input, std::move(faults));

  const std::string partial = output + ".partial";
  fs::remove(partial);
  {
    const Database database = Database::create(partial, schema);
    // Until the rename below nobody reads this file, so it need not survive a power cut.
    database.execute("PRAGMA synchronous = OFF");
    insert(database, sheets);
    if (std::vector<Problem> faults = model_faults(database, sheets); !faults.empty())
      throw InputError(ErrorKind::bad_input, std::move(faults));
    write_meta(database, sheets, schema);
    if (const std::string fault = database.integrity_fault(); !fault.empty())
      throw Error(ErrorKind::database, "the built database is not sound: " + fault);
    database.execute("VACUUM");
  }
  fs::rename(partial, output);

  BuildReport report;
  report.materials = static_cast<int>(sheets.materials.size());
  report.sources = static_cast<int>(sheets.sources.size());
  for (const SheetMaterial& m : sheets.materials) {
    report.datasets += static_cast<int>(m.datasets.size());
    for (const SheetDataset& d : m.datasets) report.goldens += static_cast<int>(d.goldens.size());
  }
  return report;
}

}  // namespace lossline::materials
