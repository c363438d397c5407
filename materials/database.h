#pragma once
// A connection to a materials database and its statements: ownership over the SQLite C interface,
// with every failure turned into one clear sentence.
//
// Safety settings of every connection: foreign keys on, trusted_schema off, defensive on, and for
// the shipped file read-only + immutable, so that it may lie in a folder nobody can write to.

#include <cstdint>
#include <optional>
#include <string>
#include <string_view>

struct sqlite3;
struct sqlite3_stmt;

namespace lossline::materials {

/// Marks a file as a Lossline materials database ('LLMD'), as in schema.sql.
inline constexpr int application_id = 1280068932;
/// Schema version this program reads and writes, as in schema.sql.
inline constexpr int schema_version = 1;

/// One prepared statement. Not thread safe; belongs to one Database.
class Statement {
 public:
  /// Prepares; throws Error database with the text of SQLite when the SQL is wrong.
  Statement(sqlite3* connection, std::string_view sql);
  ~Statement();
  Statement(Statement&& other) noexcept;
  Statement(const Statement&) = delete;
  Statement& operator=(const Statement&) = delete;
  Statement& operator=(Statement&&) = delete;

  /// Binds parameter number `index` (from 1) and returns *this, so that binds chain.
  Statement& bind(int index, double value);
  Statement& bind(int index, std::int64_t value);
  Statement& bind(int index, int value) { return bind(index, std::int64_t{value}); }
  Statement& bind(int index, std::string_view value);
  Statement& bind(int index, const char* value) { return bind(index, std::string_view(value)); }
  Statement& bind(int index, const std::string& value) {
    return bind(index, std::string_view(value));
  }
  Statement& bind_null(int index);
  Statement& bind(int index, const std::optional<double>& value);
  Statement& bind(int index, const std::optional<std::string>& value);

  /// Steps to the next row; false when there is none. Throws Error database on failure.
  bool step();
  /// Runs a statement that returns no rows, then makes it ready for the next bind.
  void run();
  void reset();

  [[nodiscard]] bool is_null(int column) const;
  [[nodiscard]] double real(int column) const;
  [[nodiscard]] std::int64_t integer(int column) const;
  [[nodiscard]] std::string text(int column) const;  ///< empty for NULL
  [[nodiscard]] std::optional<double> real_or_none(int column) const;

 private:
  sqlite3* connection_ = nullptr;
  sqlite3_stmt* statement_ = nullptr;
};

/// One open database file.
class Database {
 public:
  /// Opens a shipped database: read-only, immutable, checked (file type, application id, schema
  /// version, integrity).
  ///
  ///   throws  Error database, one sentence, when the file is missing, not a database, truncated,
  ///           damaged, from another program, or of another schema version
  static Database open_read_only(const std::string& path);

  /// Opens a user database for writing, with the same checks.
  static Database open_user(const std::string& path);

  /// Makes a new, empty database file with the given schema; refuses an existing file.
  static Database create(const std::string& path, const std::string& schema_sql);

  /// A database in memory with the given schema, for the builder's checks and the tests.
  static Database in_memory(const std::string& schema_sql);

  ~Database();
  Database(Database&& other) noexcept;
  Database& operator=(Database&& other) noexcept;
  Database(const Database&) = delete;
  Database& operator=(const Database&) = delete;

  [[nodiscard]] Statement prepare(std::string_view sql) const;
  /// Runs one or more statements without results.
  void execute(const std::string& sql) const;
  /// First column of the first row as an integer; throws Error database when there is no row.
  [[nodiscard]] std::int64_t integer(std::string_view sql) const;
  /// Full integrity and foreign-key check; empty when sound, else the first finding.
  [[nodiscard]] std::string integrity_fault() const;
  [[nodiscard]] const std::string& path() const { return path_; }

 private:
  Database(const std::string& uri, const std::string& path, int open_flags);
  void set_safety() const;
  void check_identity() const;

  sqlite3* connection_ = nullptr;
  std::string path_;
};

/// A transaction that rolls back unless commit() was reached.
class Transaction {
 public:
  explicit Transaction(const Database& database);
  ~Transaction();
  Transaction(const Transaction&) = delete;
  Transaction& operator=(const Transaction&) = delete;
  void commit();

 private:
  const Database& database_;
  bool open_ = true;
};

}  // namespace lossline::materials
