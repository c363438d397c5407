// The rules of insert.h that the schema cannot state.

#include <fmt/format.h>

#include <algorithm>
#include <map>
#include <set>

#include "materials/insert.h"

namespace lossline::materials {
namespace {

class Rules {
 public:
  explicit Rules(const Sheets& sheets) : sheets_(sheets) {
    for (const SheetQuantity& q : sheets.quantities) quantities_[q.id] = &q;
    for (const SheetForm& f : sheets.forms) forms_.insert(f.id);
  }

  std::vector<Problem> run() {
    for (const SheetSource& s : sheets_.sources) unique(s.place, "source", s.id, sources_);
    for (const SheetMaterial& m : sheets_.materials) {
      provenance(m.place, m.composition_provenance, !m.composition.empty());
      for (const SheetDataset& d : m.datasets) dataset(m, d);
      for (const SheetLimit& l : m.limits) {
        provenance(l.place, l.provenance, true);
        limit_unit(l);
      }
    }
    return std::move(problems_);
  }

 private:
  void fault(const Place& place, const std::string& key, const std::string& wrong,
             const std::string& right) {
    problems_.push_back({place.file, place.line, 0, key, wrong, right});
  }

  void unique(const Place& place, const char* what, const std::string& id,
              std::set<std::string>& seen) {
    if (!seen.insert(id).second)
      fault(place, "id", fmt::format("{} '{}' stands twice", what, id), "one id, one row");
  }

  void provenance(const Place& place, const SheetProvenance& p, bool used) {
    if (!used) return;
    for (const std::string& id : {p.source, p.reprint})
      if (!id.empty() && !sources_.contains(id))
        fault(place, "source", "unknown source '" + id + "'", "an id of sources.toml");
    if (p.grade.size() != 1) fault(place, "grade", "'" + p.grade + "'", "A to E");
  }

  void dataset(const SheetMaterial& m, const SheetDataset& d) {
    unique(d.place, "data set", d.id, datasets_);
    provenance(d.place, d.provenance, true);
    if (d.id.rfind(m.id + ".", 0) != 0)
      fault(d.place, "id", "'" + d.id + "'", "begin with '" + m.id + ".'");
    if (!(d.rel_unc > 0)) fault(d.place, "rel_unc", "not positive", "a relative uncertainty > 0");
    if (d.priority < 100)
      fault(d.place, "priority", fmt::format("{:g}", d.priority), "100 or more for shipped rows");
    if (d.kind == "model" && !forms_.contains(d.form))
      fault(d.place, "form", "unknown form '" + d.form + "'", "an id of forms.toml");
    const auto quantity = quantities_.find(d.quantity);
    if (quantity == quantities_.end()) {
      fault(d.place, "quantity", "unknown quantity '" + d.quantity + "'",
            "an id of quantities.toml");
      return;
    }
    const SheetQuantity& q = *quantity->second;
    for (const SheetPoint& p : d.points)
      if (!(p.value >= q.min_phys.value_or(-1e300) && p.value <= q.max_phys.value_or(1e300)))
        fault(d.place, "value", fmt::format("{:g} {} is not physical", p.value, q.si_unit),
              fmt::format("within [{:g}, {:g}]", q.min_phys.value_or(-1e300),
                          q.max_phys.value_or(1e300)));
    points_in_range(d);
    const bool one_reprint = d.provenance.evidence == "secondary_one" && d.provenance.grade == "B";
    const bool printed = std::any_of(d.goldens.begin(), d.goldens.end(),
                                     [](const SheetGolden& g) { return g.origin == "printed"; });
    if (one_reprint && !printed)
      fault(d.place, "grade", "B on one reprint without a printed check value",
            "a golden of origin printed, or grade C");
    static const std::set<std::string> unverified = {"from_memory", "model_derived",
                                                     "common_practice"};
    if (m.status == "complete" && unverified.contains(d.provenance.evidence))
      fault(d.place, "evidence", d.provenance.evidence + " in a material marked complete",
            "status screening, or a verified value");
  }

  void points_in_range(const SheetDataset& d) {
    for (const SheetRange& r : d.ranges)
      for (const SheetPoint& p : d.points) {
        const auto& value = r.axis == "X" ? p.X : r.axis == "T" ? p.T : r.axis == "f" ? p.f : p.T;
        if (value && !(*value >= r.lo && *value <= r.hi) &&
            (r.axis == "X" || r.axis == "T" || r.axis == "f"))
          fault(d.place, "range." + r.axis,
                fmt::format("a point at {:g} lies outside [{:g}, {:g}]", *value, r.lo, r.hi),
                "a range that holds every point");
      }
  }

  void limit_unit(const SheetLimit& l) {
    static const std::map<std::string, std::string> unit = {
        {"T_product_max", "K"},   {"T_cure_max", "K"},        {"T_runaway", "K"},
        {"p_internal_max", "Pa"}, {"X_critical", "kg/kg db"}, {"X_final_min", "kg/kg db"},
        {"dTdt_max", "K/s"},      {"dXdt_max", "1/s"},        {"E_field_max", "V/m"}};
    const auto at = unit.find(l.kind);
    if (at != unit.end() && at->second != l.unit)
      fault(l.place, "value", "'" + l.printed + "' is in " + l.unit, "a unit of " + at->second);
  }

  const Sheets& sheets_;
  std::map<std::string, const SheetQuantity*> quantities_;
  std::set<std::string> forms_, sources_, datasets_;
  std::vector<Problem> problems_;
};

}  // namespace

std::vector<Problem> faults_of(const Sheets& sheets) {
  return Rules(sheets).run();
}

}  // namespace lossline::materials
