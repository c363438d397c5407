#include "materials/database.h"

#include <fmt/format.h>
#include <sqlite3.h>

#include <filesystem>
#include <utility>

#include "planner/base/error.h"

namespace lossline::materials {
namespace {

[[noreturn]] void fail(const std::string& message) {
  throw Error(ErrorKind::database, message);
}

/// Escapes a path for a file: URI (RFC 3986: '%', '?', '#' and spaces would change its meaning).
std::string as_uri(const std::string& path, const char* query) {
  std::string uri = "file:";
  for (const char c : std::filesystem::absolute(path).string()) {
    if (c == '%' || c == '?' || c == '#' || c == ' ')
      uri += fmt::format("%{:02X}", static_cast<unsigned>(static_cast<unsigned char>(c)));
    else
      uri += c;
  }
  return uri + query;
}

std::string advice(int code) {
  switch (code & 0xff) {
    case SQLITE_NOTADB:
      return "is not a materials database (the file is of another kind)";
    case SQLITE_CORRUPT:
      return "is damaged or truncated; install it again";
    case SQLITE_CANTOPEN:
      return "cannot be opened";
    case SQLITE_READONLY:
      return "cannot be written";
    default:
      return "cannot be used";
  }
}

void require_file(const std::string& path) {
  std::error_code ignored;
  if (!std::filesystem::exists(path, ignored)) fail("materials database '" + path + "' not found");
  if (std::filesystem::is_directory(path, ignored))
    fail("materials database '" + path + "' is a folder, not a file");
  if (std::filesystem::file_size(path, ignored) == 0)
    fail("materials database '" + path + "' is empty (0 bytes); install it again");
}

}  // namespace

Statement::Statement(sqlite3* connection, std::string_view sql) : connection_(connection) {
  const int code = sqlite3_prepare_v2(connection, sql.data(), static_cast<int>(sql.size()),
                                      &statement_, nullptr);
  if (code != SQLITE_OK)
    fail(fmt::format("statement refused: {} ({})", sqlite3_errmsg(connection), sql));
}

Statement::~Statement() {
  sqlite3_finalize(statement_);
}

Statement::Statement(Statement&& other) noexcept
    : connection_(other.connection_), statement_(std::exchange(other.statement_, nullptr)) {}

Statement& Statement::bind(int index, double value) {
  sqlite3_bind_double(statement_, index, value);
  return *this;
}

Statement& Statement::bind(int index, std::int64_t value) {
  sqlite3_bind_int64(statement_, index, value);
  return *this;
}

Statement& Statement::bind(int index, std::string_view value) {
  sqlite3_bind_text64(statement_, index, value.data(), value.size(), SQLITE_TRANSIENT, SQLITE_UTF8);
  return *this;
}

Statement& Statement::bind_null(int index) {
  sqlite3_bind_null(statement_, index);
  return *this;
}

Statement& Statement::bind(int index, const std::optional<double>& value) {
  return value ? bind(index, *value) : bind_null(index);
}

Statement& Statement::bind(int index, const std::optional<std::string>& value) {
  return value && !value->empty() ? bind(index, std::string_view(*value)) : bind_null(index);
}

bool Statement::step() {
  const int code = sqlite3_step(statement_);
  if (code == SQLITE_ROW) return true;
  if (code == SQLITE_DONE) return false;
  const std::string message = sqlite3_errmsg(connection_);
  sqlite3_reset(statement_);
  if ((code & 0xff) == SQLITE_CORRUPT) fail("materials database is damaged: " + message);
  fail("database refused: " + message);
}

void Statement::run() {
  while (step()) {
  }
  reset();
}

void Statement::reset() {
  sqlite3_reset(statement_);
  sqlite3_clear_bindings(statement_);
}

bool Statement::is_null(int column) const {
  return sqlite3_column_type(statement_, column) == SQLITE_NULL;
}
double Statement::real(int column) const {
  return sqlite3_column_double(statement_, column);
}
std::int64_t Statement::integer(int column) const {
  return sqlite3_column_int64(statement_, column);
}
std::string Statement::text(int column) const {
  const unsigned char* chars = sqlite3_column_text(statement_, column);
  if (chars == nullptr) return {};
  return {reinterpret_cast<const char*>(chars),  // SQLite hands text out as unsigned char
          static_cast<std::size_t>(sqlite3_column_bytes(statement_, column))};
}
std::optional<double> Statement::real_or_none(int column) const {
  if (is_null(column)) return std::nullopt;
  return real(column);
}

Database::Database(const std::string& uri, const std::string& path, int open_flags) : path_(path) {
  const int code = sqlite3_open_v2(uri.c_str(), &connection_,
                                   open_flags | SQLITE_OPEN_URI | SQLITE_OPEN_EXRESCODE, nullptr);
  if (code != SQLITE_OK) {
    sqlite3_close(connection_);
    connection_ = nullptr;
    fail("materials database '" + path + "' " + advice(code));
  }
  sqlite3_busy_timeout(connection_, 5000);
}

Database::~Database() {
  sqlite3_close(connection_);
}

Database::Database(Database&& other) noexcept
    : connection_(std::exchange(other.connection_, nullptr)), path_(std::move(other.path_)) {}

Database& Database::operator=(Database&& other) noexcept {
  std::swap(connection_, other.connection_);
  std::swap(path_, other.path_);
  return *this;
}

void Database::set_safety() const {
  sqlite3_db_config(connection_, SQLITE_DBCONFIG_DEFENSIVE, 1, nullptr);
  sqlite3_db_config(connection_, SQLITE_DBCONFIG_TRUSTED_SCHEMA, 0, nullptr);
  sqlite3_db_config(connection_, SQLITE_DBCONFIG_ENABLE_FKEY, 1, nullptr);
}

void Database::check_identity() const {
  // The first read of the file: a foreign or cut file shows here, with SQLite's own code.
  sqlite3_stmt* raw = nullptr;
  int code = sqlite3_prepare_v2(connection_, "PRAGMA quick_check(1)", -1, &raw, nullptr);
  std::string finding;
  if (code == SQLITE_OK) {
    code = sqlite3_step(raw);
    if (code == SQLITE_ROW) {
      const unsigned char* chars = sqlite3_column_text(raw, 0);
      if (chars != nullptr) finding = reinterpret_cast<const char*>(chars);
      code = SQLITE_OK;
    }
  }
  sqlite3_finalize(raw);
  if (code != SQLITE_OK && code != SQLITE_DONE)
    fail("materials database '" + path_ + "' " + advice(code));
  if (integer("PRAGMA application_id") != application_id)
    fail("materials database '" + path_ + "' belongs to another program");
  if (finding != "ok")
    fail("materials database '" + path_ + "' is damaged or truncated; install it again (" +
         finding + ")");
  const std::int64_t version = integer("PRAGMA user_version");
  if (version != schema_version)
    fail(fmt::format("materials database '{}' has schema version {}, this program reads {}", path_,
                     version, schema_version));
}

Database Database::open_read_only(const std::string& path) {
  require_file(path);
  Database database(as_uri(path, "?mode=ro&immutable=1"), path, SQLITE_OPEN_READONLY);
  database.set_safety();
  database.check_identity();
  return database;
}

Database Database::open_user(const std::string& path) {
  require_file(path);
  Database database(as_uri(path, "?mode=rw"), path, SQLITE_OPEN_READWRITE);
  database.set_safety();
  database.check_identity();
  return database;
}

Database Database::create(const std::string& path, const std::string& schema_sql) {
  std::error_code ignored;
  if (std::filesystem::exists(path, ignored))
    fail("materials database '" + path + "' already exists");
  Database database(as_uri(path, "?mode=rwc"), path, SQLITE_OPEN_READWRITE | SQLITE_OPEN_CREATE);
  database.set_safety();
  database.execute(schema_sql);
  return database;
}

Database Database::in_memory(const std::string& schema_sql) {
  Database database(":memory:", ":memory:", SQLITE_OPEN_READWRITE | SQLITE_OPEN_CREATE);
  database.set_safety();
  database.execute(schema_sql);
  return database;
}

Statement Database::prepare(std::string_view sql) const {
  return {connection_, sql};
}

void Database::execute(const std::string& sql) const {
  char* message = nullptr;
  const int code = sqlite3_exec(connection_, sql.c_str(), nullptr, nullptr, &message);
  if (code == SQLITE_OK) return;
  const std::string text = message != nullptr ? message : sqlite3_errstr(code);
  sqlite3_free(message);
  fail("database refused: " + text);
}

std::int64_t Database::integer(std::string_view sql) const {
  Statement statement = prepare(sql);
  if (!statement.step()) fail(fmt::format("no answer to: {}", sql));
  return statement.integer(0);
}

std::string Database::integrity_fault() const {
  Statement check = prepare("PRAGMA integrity_check(1)");
  if (check.step() && check.text(0) != "ok") return check.text(0);
  Statement keys = prepare("PRAGMA foreign_key_check");
  if (keys.step())
    return fmt::format("row {} of table {} points at a missing row of {}", keys.integer(1),
                       keys.text(0), keys.text(2));
  return {};
}

Transaction::Transaction(const Database& database) : database_(database) {
  database_.execute("BEGIN IMMEDIATE");
}

Transaction::~Transaction() {
  if (!open_) return;
  try {
    database_.execute("ROLLBACK");
  } catch (const Error&) {  // SQLite rolls back by itself when the connection closes
  }
}

void Transaction::commit() {
  database_.execute("COMMIT");
  open_ = false;
}

}  // namespace lossline::materials
