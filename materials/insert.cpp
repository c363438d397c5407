#include "materials/insert.h"

#include <fmt/format.h>

#include <algorithm>

namespace lossline::materials {
namespace {

template <class Row>
std::vector<const Row*> sorted_by_id(const std::vector<Row>& rows) {
  std::vector<const Row*> out;
  out.reserve(rows.size());
  for (const Row& row : rows) out.push_back(&row);
  std::sort(out.begin(), out.end(), [](const Row* a, const Row* b) { return a->id < b->id; });
  return out;
}

std::optional<std::string> some(const std::string& text) {
  if (text.empty()) return std::nullopt;
  return text;
}

class Inserter {
 public:
  explicit Inserter(const Database& database) : db_(database) {}

  void run(const Sheets& sheets) {
    Transaction transaction(db_);
    for (const SheetSource* s : sorted_by_id(sheets.sources)) at(s->place, [&] { source(*s); });
    for (const SheetQuantity* q : sorted_by_id(sheets.quantities))
      at(q->place, [&] { quantity(*q); });
    for (const SheetForm* f : sorted_by_id(sheets.forms)) at(f->place, [&] { form(*f); });
    for (const SheetMaterial* m : sorted_by_id(sheets.materials)) {
      at(m->place, [&] { material(*m); });
      for (const SheetDataset* d : sorted_by_id(m->datasets))
        at(d->place, [&] { dataset(*m, *d); });
      for (const SheetLimit& l : m->limits) at(l.place, [&] { limit(*m, l); });
    }
    transaction.commit();
  }

 private:
  /// Runs an insertion; a refusal of the schema becomes a problem with file and line.
  template <class Use>
  void at(const Place& place, Use use) {
    try {
      use();
    } catch (const InputError&) {
      throw;
    } catch (const Error& error) {
      throw InputError(ErrorKind::bad_input, {{place.file, place.line, 0, "", error.what(),
                                               "see the rules in schema.sql"}});
    }
  }

  void source(const SheetSource& s) {
    Statement row = db_.prepare(
        "INSERT INTO source(source_id, kind, authors, title, year, container, volume, pages,"
        " publisher, standard_no, doi, locator_note, licence, obtained)"
        " VALUES(?1,?2,?3,?4,?5,?6,?7,?8,?9,?10,?11,?12,?13,?14)");
    row.bind(1, s.id).bind(2, s.kind).bind(3, some(s.authors)).bind(4, s.title);
    if (s.year)
      row.bind(5, static_cast<std::int64_t>(*s.year));
    else
      row.bind_null(5);
    row.bind(6, some(s.container)).bind(7, some(s.volume)).bind(8, some(s.pages));
    row.bind(9, some(s.publisher)).bind(10, some(s.standard_no)).bind(11, some(s.doi));
    row.bind(12, some(s.note)).bind(13, some(s.licence)).bind(14, s.obtained);
    row.run();
  }

  void quantity(const SheetQuantity& q) {
    Statement row = db_.prepare("INSERT INTO quantity VALUES(?1,?2,?3,?4,?5,?6)");
    row.bind(1, q.id).bind(2, q.si_unit).bind(3, q.description);
    row.bind(4, q.min_phys).bind(5, q.max_phys).bind(6, q.transform).run();
  }

  void form(const SheetForm& f) {
    Statement row = db_.prepare("INSERT INTO model_form VALUES(?1,?2,?3,?4,?5)");
    row.bind(1, f.id).bind(2, static_cast<std::int64_t>(f.version)).bind(3, f.formula);
    row.bind(4, f.inputs).bind(5, some(f.note)).run();
  }

  std::int64_t provenance(const SheetProvenance& p) {
    Statement row = db_.prepare(
        "INSERT INTO provenance(prov_id, evidence, grade, source_id, locator, reprint_source_id,"
        " reprint_locator, entered_by, entered_on, discrepancy, note)"
        " VALUES(?1,?2,?3,?4,?5,?6,?7,?8,?9,?10,?11)");
    const std::int64_t id = ++last_provenance_;
    row.bind(1, id).bind(2, p.evidence).bind(3, p.grade).bind(4, some(p.source));
    row.bind(5, some(p.locator)).bind(6, some(p.reprint)).bind(7, some(p.reprint_locator));
    row.bind(8, p.entered_by).bind(9, p.entered_on).bind(10, some(p.discrepancy));
    row.bind(11, some(p.note)).run();
    return id;
  }

  void material(const SheetMaterial& m) {
    Statement row = db_.prepare(
        "INSERT INTO material(material_id, name, family, form, status, description, needs, created)"
        " VALUES(?1,?2,?3,?4,?5,?6,?7,?8)");
    row.bind(1, m.id).bind(2, m.name).bind(3, m.family).bind(4, m.form).bind(5, m.status);
    row.bind(6, some(m.description)).bind(7, some(m.needs)).bind(8, m.created).run();
    for (const std::string& alias : m.aliases)
      db_.prepare("INSERT INTO material_alias VALUES(?1,'en',?2)")
          .bind(1, alias)
          .bind(2, m.id)
          .run();
    if (m.composition.empty()) return;
    const std::int64_t prov = provenance(m.composition_provenance);
    for (const SheetParam& part : m.composition)
      db_.prepare("INSERT INTO composition VALUES(?1,?2,?3,?4,?5)")
          .bind(1, m.id)
          .bind(2, part.name)
          .bind(3, part.value)
          .bind(4, m.composition_basis)
          .bind(5, prov)
          .run();
  }

  void dataset(const SheetMaterial& m, const SheetDataset& d) {
    const std::int64_t prov = provenance(d.provenance);
    Statement row = db_.prepare(
        "INSERT INTO dataset(dataset_id, material_id, quantity_id, kind, direction, branch,"
        " moisture_basis, of_phase, bulk_density, prov_id, priority, rel_unc, unc_kind, safety_use,"
        " note) VALUES(?1,?2,?3,?4,?5,?6,?7,?8,?9,?10,?11,?12,?13,?14,?15)");
    row.bind(1, d.id).bind(2, m.id).bind(3, d.quantity).bind(4, d.kind).bind(5, d.direction);
    row.bind(6, d.branch).bind(7, d.moisture_basis).bind(8, d.of_phase).bind(9, d.bulk_density);
    row.bind(10, prov).bind(11, static_cast<std::int64_t>(d.priority)).bind(12, d.rel_unc);
    row.bind(13, d.unc_kind).bind(14, d.safety_use ? 1 : 0).bind(15, some(d.provenance.note)).run();
    if (d.kind == "model")
      db_.prepare("INSERT INTO dataset_model VALUES(?1,?2)").bind(1, d.id).bind(2, d.form).run();
    for (const SheetRange& r : d.ranges)
      db_.prepare(
             "INSERT INTO axis_range(dataset_id, axis, lo, hi, low_policy, high_policy)"
             " VALUES(?1,?2,?3,?4,?5,?6)")
          .bind(1, d.id)
          .bind(2, r.axis)
          .bind(3, r.lo)
          .bind(4, r.hi)
          .bind(5, r.low_policy)
          .bind(6, r.high_policy)
          .run();
    for (const SheetParam& p : d.params)
      db_.prepare(
             "INSERT INTO model_param(dataset_id, name, value, unit, as_printed, evidence,"
             " note) VALUES(?1,?2,?3,?4,?5,?6,?7)")
          .bind(1, d.id)
          .bind(2, p.name)
          .bind(3, p.value)
          .bind(4, p.unit)
          .bind(5, some(p.printed))
          .bind(6, some(p.evidence))
          .bind(7, some(p.note))
          .run();
    int seq = 0;
    for (const SheetPoint& p : d.points)
      db_.prepare(
             "INSERT INTO point(dataset_id, seq, X, T, f, value, value_im, u_value, u_im,"
             " as_printed) VALUES(?1,?2,?3,?4,?5,?6,?7,?8,?9,?10)")
          .bind(1, d.id)
          .bind(2, ++seq)
          .bind(3, p.X)
          .bind(4, p.T)
          .bind(5, p.f)
          .bind(6, p.value)
          .bind(7, p.value_im)
          .bind(8, p.u_value)
          .bind(9, p.u_im)
          .bind(10, some(p.printed))
          .run();
    int number = 0;
    for (const SheetGolden& g : d.goldens)
      at(g.place, [&] {
        db_.prepare(
               "INSERT INTO golden(golden_id, dataset_id, X, T, f, aw, alpha, p, band, expect,"
               " expect_im, tol_rel, origin)"
               " VALUES(?1,?2,?3,?4,?5,?6,?7,?8,?9,?10,?11,?12,?13)")
            .bind(1, fmt::format("{}.{:02}", d.id, ++number))
            .bind(2, d.id)
            .bind(3, g.X)
            .bind(4, g.T)
            .bind(5, g.f)
            .bind(6, g.aw)
            .bind(7, g.alpha)
            .bind(8, g.p)
            .bind(9, g.band)
            .bind(10, g.expect)
            .bind(11, g.expect_im)
            .bind(12, g.tolerance)
            .bind(13, g.origin)
            .run();
      });
  }

  void limit(const SheetMaterial& m, const SheetLimit& l) {
    const std::int64_t prov = provenance(l.provenance);
    db_.prepare(
           "INSERT INTO limit_value(material_id, kind, value, unit, as_printed, cond_X_lo,"
           " cond_X_hi, reason, severity, prov_id) VALUES(?1,?2,?3,?4,?5,?6,?7,?8,?9,?10)")
        .bind(1, m.id)
        .bind(2, l.kind)
        .bind(3, l.value)
        .bind(4, l.unit)
        .bind(5, l.printed)
        .bind(6, l.X_from)
        .bind(7, l.X_to)
        .bind(8, l.reason)
        .bind(9, l.severity)
        .bind(10, prov)
        .run();
  }

  const Database& db_;
  std::int64_t last_provenance_ = 0;
};

}  // namespace

void insert(const Database& database, const Sheets& sheets) {
  Inserter(database).run(sheets);
}

}  // namespace lossline::materials
