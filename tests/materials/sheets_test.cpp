// Building the database from authored sheets: every fault with its file and line, and the same
// rows from the same sheets.

#include "materials/sheets.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <filesystem>

#include "materials/build_database.h"
#include "materials/units.h"
#include "tests/materials/fixtures.h"

namespace lossline::materials {
namespace {

namespace fs = std::filesystem;
using test::Folder;
using test::message_of;
using ::testing::AllOf;
using ::testing::HasSubstr;

/// All rows of all tables as text, in the order of the file.
std::string dump(const std::string& path) {
  const Database db = Database::open_read_only(path);
  std::string out;
  Statement tables =
      db.prepare("SELECT name, sql FROM sqlite_master WHERE sql IS NOT NULL ORDER BY name");
  while (tables.step()) {
    out += tables.text(1) + "\n";
    Statement columns =
        db.prepare("SELECT count(*) FROM pragma_table_info('" + tables.text(0) + "')");
    columns.step();
    if (columns.integer(0) == 0) continue;
    Statement rows = db.prepare("SELECT * FROM \"" + tables.text(0) + "\"");
    while (rows.step()) {
      for (int c = 0; c < columns.integer(0); ++c) out += rows.text(c) + "|";
      out += "\n";
    }
  }
  return out;
}

/// A data folder with one good material, to be spoilt by a test.
class SmallData {
 public:
  SmallData() {
    for (const char* name : {"sources.toml", "quantities.toml", "forms.toml"})
      fs::create_directories(folder_ / "data"),
          fs::copy_file(test::data_folder() + "/" + name, folder_ / ("data/" + std::string(name)));
    fs::create_directories(folder_ / "data/carrot");
    for (const char* name : {"material.toml", "eps_fresh.csv"})
      fs::copy_file(test::data_folder() + "/carrot/" + name,
                    folder_ / ("data/carrot/" + std::string(name)));
  }
  /// Replaces the first `from` in a file by `to`.
  void spoil(const std::string& file, const std::string& from, const std::string& to) {
    std::string text = test::read_text(folder_ / ("data/" + file));
    const std::size_t at = text.find(from);
    ASSERT_NE(at, std::string::npos) << from;
    text.replace(at, from.size(), to);
    test::write_text(folder_ / ("data/" + file), text);
  }
  std::string build() {
    return message_of(
        [&] { (void)build_database(folder_ / "data", test::schema_file(), folder_ / "out.db"); });
  }
  bool built() { return fs::exists(folder_ / "out.db"); }

 private:
  Folder folder_;
};

TEST(Build, GivesTheSameDumpTwice) {
  const Folder folder;
  (void)build_database(test::data_folder(), test::schema_file(), folder / "one.db");
  (void)build_database(test::data_folder(), test::schema_file(), folder / "two.db");
  const std::string one = dump(folder / "one.db");
  EXPECT_GT(one.size(), 50000u);
  EXPECT_TRUE(one == dump(folder / "two.db"));
  EXPECT_TRUE(one == dump(test::shipped())) << "the build tree's database is out of date";
}

TEST(Build, NotesTheDigestOfEveryInput) {
  const Database db = Database::open_read_only(test::shipped());
  EXPECT_EQ(db.integer("SELECT count(*) FROM meta WHERE key LIKE 'input:%/material.toml'"),
            db.integer("SELECT count(*) FROM material"));
  EXPECT_EQ(db.integer("SELECT length(value) FROM meta WHERE key = 'inputs_sha256'"), 64);
}

TEST(Build, AcceptsTheSmallFolder) {
  SmallData data;
  EXPECT_EQ(data.build(), "");
  EXPECT_TRUE(data.built());
}

TEST(Build, NamesFileAndLineOfAnUnknownUnitAndGoesOnToTheNextFault) {
  SmallData data;
  data.spoil("carrot/material.toml", "\"1515 kg/m3\"", "\"1515 kg/l\"");
  data.spoil("carrot/material.toml", "family = \"food\"", "famly = \"food\"");
  EXPECT_THAT(data.build(), AllOf(HasSubstr("carrot/material.toml:"), HasSubstr("'1515 kg/l'"),
                                  HasSubstr("material.famly: unknown key"),
                                  HasSubstr("material.family: missing")));
  EXPECT_FALSE(data.built());
}

TEST(Build, NamesTheLineOfBrokenToml) {
  SmallData data;
  data.spoil("carrot/material.toml", "[material]", "[material");
  EXPECT_THAT(data.build(), HasSubstr("carrot/material.toml:1:"));
}

TEST(Build, RefusesAnUnknownSource) {
  SmallData data;
  data.spoil("carrot/material.toml", "\"zogzas_1996\"", "\"nobody_1900\"");
  EXPECT_THAT(data.build(), HasSubstr("unknown source 'nobody_1900'"));
}

TEST(Build, RefusesAGradeTheEvidenceDoesNotAllow) {
  SmallData data;
  data.spoil("carrot/material.toml", "evidence = \"model_derived\"\ngrade = \"E\"",
             "evidence = \"model_derived\"\ngrade = \"B\"");
  EXPECT_THAT(data.build(),
              AllOf(HasSubstr("carrot/material.toml:"), HasSubstr("model_is_c_to_e")));
}

TEST(Build, RefusesGradeBOnOneReprintWithoutAPrintedCheckValue) {
  SmallData data;
  data.spoil("carrot/material.toml", "evidence = \"secondary_one\"\ngrade = \"C\"",
             "evidence = \"secondary_one\"\ngrade = \"B\"");
  EXPECT_THAT(data.build(), HasSubstr("B on one reprint without a printed check value"));
}

TEST(Build, RefusesUnverifiedDataInAMaterialMarkedComplete) {
  SmallData data;
  data.spoil("carrot/material.toml", "status = \"screening\"", "status = \"complete\"");
  EXPECT_THAT(data.build(), HasSubstr("in a material marked complete"));
}

TEST(Build, RefusesACheckValueTheModelDoesNotMeet) {
  SmallData data;
  data.spoil("carrot/material.toml", "expect = \"3.88 kJ/(kg K)\"", "expect = \"3.98 kJ/(kg K)\"");
  EXPECT_THAT(data.build(), AllOf(HasSubstr("carrot/material.toml:"), HasSubstr("expected 3980")));
}

TEST(Build, RefusesABadRowOfASeries) {
  SmallData data;
  data.spoil("carrot/eps_fresh.csv", "56,15", "56,-15");
  EXPECT_THAT(data.build(), AllOf(HasSubstr("carrot/eps_fresh.csv:5"), HasSubstr("eps'' = -15")));
}

TEST(Build, RefusesAValueBeyondItsPhysicalBounds) {
  SmallData data;
  data.spoil("carrot/material.toml", "\"1515 kg/m3\"\nof_phase", "\"15150 kg/m3\"\nof_phase");
  EXPECT_THAT(data.build(), HasSubstr("15150 kg/m3 is not physical"));
}

TEST(Build, RefusesAMissingFolder) {
  EXPECT_THAT(message_of([] { (void)build_database("/nowhere", test::schema_file(), "/tmp/x"); }),
              HasSubstr("data folder '/nowhere' not found"));
}

TEST(Units, ConvertMoistureTemperatureAndRates) {
  EXPECT_DOUBLE_EQ(unit_value("79 % wb")->value, 0.79 / 0.21);
  EXPECT_DOUBLE_EQ(unit_value("12 % db")->value, 0.12);
  EXPECT_DOUBLE_EQ(unit_value("20 degC")->value, 293.15);
  EXPECT_DOUBLE_EQ(unit_value("6 1/min")->value, 0.1);
  EXPECT_FALSE(unit_value("100 % wb"));
  EXPECT_FALSE(unit_value("5 furlong"));
  EXPECT_FALSE(unit_value("five m"));
  EXPECT_FALSE(unit_value("inf m"));
  EXPECT_FALSE(unit_value("5"));
}

}  // namespace
}  // namespace lossline::materials
