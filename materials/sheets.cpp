#include "materials/sheets.h"

#include <fmt/format.h>

#include <algorithm>
#include <filesystem>
#include <fstream>
#include <sstream>

#include "materials/series.h"
#include "materials/sha256.h"
#include "materials/sheet_fields.h"
#include "materials/units.h"

namespace lossline::materials {
namespace {

namespace fs = std::filesystem;

class Reader {
 public:
  explicit Reader(const std::string& folder) : folder_(folder) {}

  Sheets read() {
    if (!fs::is_directory(folder_))
      throw Error(ErrorKind::not_found, "data folder '" + folder_ + "' not found");
    read_file("sources.toml", "source", [&](SheetFields& f) { read_source(f); });
    read_file("quantities.toml", "quantity", [&](SheetFields& f) { read_quantity(f); });
    read_file("forms.toml", "form", [&](SheetFields& f) { read_form(f); });
    std::vector<std::string> folders;
    for (const auto& entry : fs::directory_iterator(folder_))
      if (entry.is_directory()) folders.push_back(entry.path().filename().string());
    std::sort(folders.begin(), folders.end());
    for (const std::string& name : folders) read_material(name);
    if (!problems_.empty()) throw InputError(ErrorKind::bad_input, std::move(problems_));
    return std::move(sheets_);
  }

 private:
  std::string load(const std::string& relative) {
    std::ifstream in(fs::path(folder_) / relative, std::ios::binary);
    if (!in) throw Error(ErrorKind::not_found, "'" + folder_ + "/" + relative + "' not found");
    std::ostringstream text;
    text << in.rdbuf();
    sheets_.inputs[relative] = sha256(text.str());
    return text.str();
  }

  std::optional<toml::table> parse(const std::string& relative) {
    const std::string text = load(relative);
    try {
      return toml::parse(text, relative);
    } catch (const toml::parse_error& error) {
      problems_.push_back({relative, static_cast<int>(error.source().begin.line),
                           static_cast<int>(error.source().begin.column), "",
                           std::string(error.description()), "valid TOML"});
      return std::nullopt;
    }
  }

  template <class Use>
  void read_file(const std::string& relative, const char* name, Use use) {
    const auto document = parse(relative);
    if (!document) return;
    SheetFields top(*document, relative, "", problems_);
    for (const toml::table* table : top.tables(name)) {
      SheetFields fields(*table, relative, name, problems_);
      use(fields);
      fields.refuse_unknown();
    }
    top.refuse_unknown();
  }

  void read_source(SheetFields& f) {
    SheetSource s;
    s.place = f.place();
    s.id = f.text("id");
    s.kind = f.text("kind");
    s.title = f.text("title");
    s.obtained = f.text("obtained");
    s.authors = f.text("authors", false);
    s.year = f.number("year");
    s.container = f.text("container", false);
    s.volume = f.text("volume", false);
    s.pages = f.text("pages", false);
    s.publisher = f.text("publisher", false);
    s.standard_no = f.text("standard_no", false);
    s.doi = f.text("doi", false);
    s.note = f.text("note", false);
    s.licence = f.text("licence", false);
    sheets_.sources.push_back(std::move(s));
  }

  void read_quantity(SheetFields& f) {
    SheetQuantity q;
    q.place = f.place();
    q.id = f.text("id");
    q.si_unit = f.text("si_unit");
    q.description = f.text("description");
    q.transform = f.text_or("transform", "lin");
    q.min_phys = f.number("min");
    q.max_phys = f.number("max");
    sheets_.quantities.push_back(std::move(q));
  }

  void read_form(SheetFields& f) {
    SheetForm form;
    form.place = f.place();
    form.id = f.text("id");
    form.version = f.number("version", true).value_or(1);
    form.formula = f.text("formula");
    form.inputs = f.text("inputs");
    form.note = f.text("note", false);
    sheets_.forms.push_back(std::move(form));
  }

  void read_material(const std::string& name) {
    const std::string file = name + "/material.toml";
    const auto document = parse(file);
    if (!document) return;
    SheetFields top(*document, file, name, problems_);
    SheetMaterial m;
    SheetProvenance defaults;
    if (const toml::table* table = top.table("material")) {
      SheetFields f(*table, file, "material", problems_);
      m.place = f.place();
      m.id = f.text("id");
      if (m.id != name) f.fault("id", "'" + m.id + "' in folder '" + name + "'", "the same name");
      m.name = f.text("name");
      m.family = f.text("family");
      m.form = f.text("form");
      m.status = f.text("status");
      m.description = f.text("description", false);
      m.needs = f.text("needs", false);
      m.aliases = f.texts("aliases");
      defaults.entered_by = f.text("entered_by");
      m.created = defaults.entered_on = f.text("entered_on");
      f.refuse_unknown();
    } else {
      top.fault("material", "missing", "[material] with id, name, family, form, status");
    }
    if (const toml::table* table = top.table("composition")) {
      SheetFields f(*table, file, "composition", problems_);
      m.composition_basis = f.text("basis");
      for (const char* part : {"water", "protein", "fat", "carbohydrate", "fibre", "ash"})
        if (const auto share = f.quantity(part, "1"))
          m.composition.push_back({part, "1", "", "", "", *share});
      m.composition_provenance = f.provenance(defaults);
      f.refuse_unknown();
    }
    if (top.raw().contains("dataset"))
      for (const toml::table* table : top.tables("dataset"))
        m.datasets.push_back(read_dataset(*table, file, name, defaults));
    if (top.raw().contains("limit"))
      for (const toml::table* table : top.tables("limit"))
        m.limits.push_back(read_limit(*table, file, defaults));
    top.refuse_unknown();
    sheets_.materials.push_back(std::move(m));
  }

  SheetDataset read_dataset(const toml::table& table, const std::string& file,
                            const std::string& folder, const SheetProvenance& defaults) {
    SheetFields f(table, file, "dataset", problems_);
    SheetDataset d;
    d.place = f.place();
    d.id = f.text("id");
    d.quantity = f.text("quantity");
    d.kind = f.text("kind");
    d.direction = f.text_or("direction", "iso");
    d.branch = f.text_or("branch", "na");
    d.moisture_basis = f.text_or("moisture_basis", "none");
    d.of_phase = f.text("of_phase");
    d.bulk_density = f.quantity("bulk_density", "kg/m3");
    d.priority = f.number("priority").value_or(100);
    d.rel_unc = f.number("rel_unc", true).value_or(0);
    d.unc_kind = f.text_or("unc_kind", "guess");
    d.safety_use = f.truth("safety_use");
    d.provenance = f.provenance(defaults);
    if (d.kind == "model") d.form = f.text("form");
    if (d.kind == "constant") {
      SheetPoint p;
      p.value = f.quantity("value", "", true, &p.printed).value_or(0);
      d.points.push_back(p);
      if (const auto unit = unit_value(p.printed)) check_unit(f, d.quantity, unit->si);
    }
    if (d.kind == "points") read_points(f, folder, d);
    if (const toml::table* params = f.table("param")) read_params(*params, file, d);
    if (const toml::table* ranges = f.table("range")) read_ranges(*ranges, file, d);
    if (table.contains("golden"))
      for (const toml::table* golden : f.tables("golden"))
        d.goldens.push_back(read_golden(*golden, file));
    f.refuse_unknown();
    return d;
  }

  void check_unit(const SheetFields& f, const std::string& quantity, const std::string& si) {
    for (const SheetQuantity& q : sheets_.quantities)
      if (q.id == quantity && q.si_unit != si)
        f.fault("value", "is in " + si, "a unit of " + q.si_unit);
  }

  void read_points(SheetFields& f, const std::string& folder, SheetDataset& d) {
    const std::string name = f.text("series");
    if (name.empty()) return;
    const std::string relative = folder + "/" + name;
    try {
      const Series series = read_series(load(relative), relative);
      for (const RejectedRow& row : series.rejected)
        problems_.push_back({relative, row.line, 0, "", row.reason, "mend or remove the row"});
      for (const SeriesPoint& p : series.points)
        d.points.push_back({p.moisture, p.temperature, p.frequency, p.eps_re, p.eps_im, p.u_re,
                            p.u_im, p.printed});
    } catch (const InputError& error) {
      problems_.insert(problems_.end(), error.problems().begin(), error.problems().end());
    }
  }

  void read_params(const toml::table& table, const std::string& file, SheetDataset& d) {
    SheetFields f(table, file, "dataset.param", problems_);
    for (const auto& [key, node] : table) {
      const std::string name(key.str());
      SheetParam p;
      p.name = name;
      if (const toml::table* inner = node.as_table()) {
        SheetFields g(*inner, file, "dataset.param." + name, problems_);
        p.value = g.quantity("v", "", true, &p.printed, &p.unit).value_or(0);
        p.evidence = g.text("evidence", false);
        p.note = g.text("note", false);
        g.refuse_unknown();
      } else {
        p.value = f.quantity(name.c_str(), "", true, &p.printed, &p.unit).value_or(0);
      }
      d.params.push_back(std::move(p));
    }
  }

  void read_ranges(const toml::table& table, const std::string& file, SheetDataset& d) {
    static const std::map<std::string, std::string> unit = {
        {"X", "kg/kg db"}, {"T", "K"},  {"f", "Hz"},     {"aw", "1"},
        {"alpha", "1"},    {"p", "Pa"}, {"rho", "kg/m3"}};
    SheetFields outer(table, file, "dataset.range", problems_);
    for (const auto& [axis, si] : unit) {
      const toml::table* inner = outer.table(axis.c_str());
      if (inner == nullptr) continue;
      SheetFields f(*inner, file, "dataset.range." + axis, problems_);
      SheetRange r;
      r.axis = axis;
      r.lo = f.quantity("lo", si, true).value_or(0);
      r.hi = f.quantity("hi", si, true).value_or(0);
      r.low_policy = f.text("low");
      r.high_policy = f.text("high");
      if (!(r.lo <= r.hi)) f.fault("lo", "above hi", "lo <= hi");
      f.refuse_unknown();
      d.ranges.push_back(std::move(r));
    }
    outer.refuse_unknown();
  }

  SheetGolden read_golden(const toml::table& table, const std::string& file) {
    SheetFields f(table, file, "dataset.golden", problems_);
    SheetGolden g;
    g.place = f.place();
    g.X = f.quantity("X", "kg/kg db");
    g.T = f.quantity("T", "K");
    g.f = f.quantity("f", "Hz");
    g.aw = f.quantity("aw", "1");
    g.alpha = f.quantity("alpha", "1");
    g.p = f.quantity("p", "Pa");
    g.band = f.text_or("band", "nominal");
    g.expect = f.quantity("expect", "", true).value_or(0);
    g.expect_im = f.number("expect_im");
    g.tolerance = f.number("tol", true).value_or(0);
    g.origin = f.text("origin");
    f.refuse_unknown();
    return g;
  }

  SheetLimit read_limit(const toml::table& table, const std::string& file,
                        const SheetProvenance& defaults) {
    SheetFields f(table, file, "limit", problems_);
    SheetLimit l;
    l.place = f.place();
    l.kind = f.text("kind");
    l.value = f.quantity("value", "", true, &l.printed, &l.unit).value_or(0);
    l.X_from = f.quantity("X_from", "kg/kg db");
    l.X_to = f.quantity("X_to", "kg/kg db");
    l.reason = f.text("reason");
    l.severity = f.text("severity");
    l.provenance = f.provenance(defaults);
    f.refuse_unknown();
    return l;
  }

  std::string folder_;
  Sheets sheets_;
  std::vector<Problem> problems_;
};

}  // namespace

Sheets read_sheets(const std::string& folder) {
  return Reader(folder).read();
}

}  // namespace lossline::materials
