// Opening files that cannot be used: one clear sentence each.

#include "materials/database.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <cstdlib>

#include "materials/sha256.h"
#include "tests/materials/fixtures.h"

namespace lossline::materials {
namespace {

using test::Folder;
using test::message_of;
using ::testing::AllOf;
using ::testing::EndsWith;
using ::testing::HasSubstr;

std::string opening(const std::string& path) {
  return message_of([&] { (void)Database::open_read_only(path); });
}

TEST(DatabaseFile, OpensTheShippedOneAndRefusesToWriteToIt) {
  const Database db = Database::open_read_only(test::shipped());
  EXPECT_EQ(db.integer("PRAGMA foreign_keys"), 1);
  EXPECT_EQ(db.integer("PRAGMA trusted_schema"), 0);
  EXPECT_EQ(db.integrity_fault(), "");
  EXPECT_NE(message_of([&] { db.execute("DELETE FROM material"); }), "");
}

TEST(DatabaseFile, SaysThatAMissingFileIsNotFound) {
  const Folder folder;
  EXPECT_EQ(opening(folder / "none.db"),
            "materials database '" + (folder / "none.db") + "' not found");
}

TEST(DatabaseFile, SaysThatATextFileIsOfAnotherKind) {
  const Folder folder;
  test::write_text(folder / "text.db", std::string(2000, 'x'));
  EXPECT_THAT(opening(folder / "text.db"), HasSubstr("is not a materials database"));
}

TEST(DatabaseFile, SaysThatAnEmptyFileIsEmpty) {
  const Folder folder;
  test::write_text(folder / "empty.db", "");
  EXPECT_THAT(opening(folder / "empty.db"), HasSubstr("is empty (0 bytes)"));
}

TEST(DatabaseFile, SaysThatATruncatedFileIsDamagedAtEveryLength) {
  const Folder folder;
  const std::string whole = test::read_text(test::shipped());
  for (const double share : {0.02, 0.3, 0.5, 0.9, 0.99}) {
    const auto size = static_cast<std::size_t>(static_cast<double>(whole.size()) * share);
    test::write_text(folder / "cut.db", whole.substr(0, size));
    EXPECT_THAT(opening(folder / "cut.db"), HasSubstr("is damaged or truncated")) << share;
  }
}

TEST(DatabaseFile, NoticesAPageOfRubbish) {
  const Folder folder;
  std::string bytes = test::read_text(test::shipped());
  for (std::size_t i = 0; i < 4096; ++i) bytes[bytes.size() / 2 / 4096 * 4096 + i] = '\x5a';
  test::write_text(folder / "bad.db", bytes);
  EXPECT_THAT(opening(folder / "bad.db"), HasSubstr("is damaged or truncated"));
}

TEST(DatabaseFile, SaysThatADatabaseOfAnotherProgramIsForeign) {
  const Folder folder;
  (void)Database::create(folder / "foreign.db", "CREATE TABLE t(a); PRAGMA application_id = 7;");
  EXPECT_THAT(opening(folder / "foreign.db"), EndsWith("belongs to another program"));
}

TEST(DatabaseFile, NamesBothSchemaVersionsWhenTheyDiffer) {
  const Folder folder;
  (void)Database::create(folder / "new.db",
                         "CREATE TABLE t(a); PRAGMA application_id = 1280068932;"
                         " PRAGMA user_version = 9;");
  EXPECT_THAT(opening(folder / "new.db"),
              AllOf(HasSubstr("schema version 9"), HasSubstr("reads 1")));
}

TEST(DatabaseFile, OpensInAPathWithSpacesAndSigns) {
  const Folder folder;
  const std::string path = folder / "a b#c?d%e/materials.db";
  test::write_text(path, test::read_text(test::shipped()));
  EXPECT_EQ(opening(path), "");
}

TEST(DatabaseFile, RollsATransactionBackUnlessItWasCommitted) {
  const Database db = Database::in_memory("CREATE TABLE t(a INTEGER) STRICT");
  {
    const Transaction transaction(db);
    db.execute("INSERT INTO t VALUES(1)");
  }
  EXPECT_EQ(db.integer("SELECT count(*) FROM t"), 0);
}

TEST(FindBaseDatabase, PrefersTheEnvironmentThenLooksBesideTheProgram) {
  const Folder folder;
  test::write_text(folder / "share/lossline/materials.db", "x");
  test::write_text(folder / "elsewhere.db", "x");
  test::write_text(folder / "bin/lossline", "x");
  unsetenv("LOSSLINE_MATERIALS");
  EXPECT_EQ(find_base_database(folder / "bin/lossline"), folder / "share/lossline/materials.db");
  setenv("LOSSLINE_MATERIALS", (folder / "elsewhere.db").c_str(), 1);
  EXPECT_EQ(find_base_database(folder / "bin/lossline"), folder / "elsewhere.db");
  setenv("LOSSLINE_MATERIALS", (folder / "none.db").c_str(), 1);
  EXPECT_THAT(message_of([&] { (void)find_base_database(folder / "bin/lossline"); }),
              AllOf(HasSubstr("not found"), HasSubstr(folder / "none.db")));
  unsetenv("LOSSLINE_MATERIALS");
}

// FIPS 180-4 examples (csrc.nist.gov, SHA256.pdf): one block, two blocks, and the empty message.
TEST(Sha256, MatchesThePublishedExamples) {
  EXPECT_EQ(sha256("abc"), "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad");
  EXPECT_EQ(sha256("abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq"),
            "248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1");
  EXPECT_EQ(sha256(""), "e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855");
}

}  // namespace
}  // namespace lossline::materials
