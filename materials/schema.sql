-- Lossline materials database, schema version 1.
--
-- Rules the database itself keeps, so that no tool can break them:
--   * every value hangs on a provenance row: how it reached us (evidence), how far it may be
--     trusted (grade) and where it stands (source, locator);
--   * evidence bounds the grade: a value from memory is never better than D, and D only with the
--     intended source named; a model is never better than C; a guess is E;
--   * no limit rests on grade E.
-- State variables are stored in one set of units: X kg water per kg DRY solid, T kelvin, f hertz,
-- aw 0..1, rho kg/m3, alpha 0..1, p pascal. What was printed is kept beside it (as_printed).
-- Shipped rows are read-only at run time. User rows live in a second file with this same schema
-- and out-rank shipped ones (lower priority number); they never change them.

PRAGMA application_id = 1280068932;  -- 'LLMD'
PRAGMA user_version = 1;
PRAGMA foreign_keys = ON;

CREATE TABLE meta(key TEXT PRIMARY KEY, value TEXT NOT NULL) STRICT;

CREATE TABLE source(
  source_id TEXT PRIMARY KEY,
  kind TEXT NOT NULL CHECK(kind IN
    ('journal','book','standard','thesis','report','web','patent','user_lab','none')),
  authors TEXT, title TEXT NOT NULL, year INTEGER, container TEXT, volume TEXT, pages TEXT,
  publisher TEXT, standard_no TEXT, doi TEXT, locator_note TEXT, licence TEXT,
  obtained TEXT NOT NULL CHECK(obtained IN
    ('full_text','abstract_only','secondary_copy','not_obtained'))
) STRICT;

CREATE TABLE material(
  material_id TEXT PRIMARY KEY CHECK(material_id <> '' AND material_id NOT GLOB '*[^a-z0-9_]*'),
  name TEXT NOT NULL UNIQUE,
  family TEXT NOT NULL CHECK(family IN
    ('food','plant','wood','board','paper','textile','leather','mineral','ceramic','sorbent',
     'resin','rubber','foundry','foam','reference')),
  form TEXT NOT NULL CHECK(form IN
    ('pieces','granular','sheet','mat','fabric','solid_body','honeycomb','beads','liquid',
     'profile')),
  status TEXT NOT NULL CHECK(status IN
    ('complete','screening','thermal_only','incomplete','retired')),
  parent_id TEXT REFERENCES material(material_id),
  origin TEXT NOT NULL DEFAULT 'shipped' CHECK(origin IN ('shipped','user')),
  description TEXT, needs TEXT, created TEXT NOT NULL, retired_by TEXT
) STRICT;

CREATE TABLE material_alias(
  alias TEXT NOT NULL, lang TEXT NOT NULL,
  material_id TEXT NOT NULL REFERENCES material(material_id) ON DELETE CASCADE,
  PRIMARY KEY(alias, lang, material_id)
) STRICT;

CREATE TABLE quantity(
  quantity_id TEXT PRIMARY KEY, si_unit TEXT NOT NULL, description TEXT NOT NULL,
  min_phys REAL, max_phys REAL,
  transform TEXT NOT NULL DEFAULT 'lin' CHECK(transform IN ('lin','log','cuberoot','sqrt'))
) STRICT;

CREATE TABLE provenance(
  prov_id INTEGER PRIMARY KEY,
  evidence TEXT NOT NULL CHECK(evidence IN
    ('primary_read','secondary_two','secondary_one','abstract_only','from_memory',
     'model_derived','common_practice','user_measured','user_estimate')),
  grade TEXT NOT NULL CHECK(grade IN ('A','B','C','D','E')),
  source_id TEXT REFERENCES source(source_id), locator TEXT,
  reprint_source_id TEXT REFERENCES source(source_id), reprint_locator TEXT,
  entered_by TEXT NOT NULL, entered_on TEXT NOT NULL, checked_by TEXT, checked_on TEXT,
  discrepancy TEXT, note TEXT,
  CONSTRAINT evidence_read_needs_source CHECK(evidence NOT IN
    ('primary_read','secondary_two','secondary_one','abstract_only') OR source_id IS NOT NULL),
  CONSTRAINT from_memory_is_d_or_e CHECK(evidence <> 'from_memory' OR grade IN ('D','E')),
  CONSTRAINT from_memory_without_source_is_e
    CHECK(evidence <> 'from_memory' OR grade = 'E' OR source_id IS NOT NULL),
  CONSTRAINT model_is_c_to_e CHECK(evidence <> 'model_derived' OR grade IN ('C','D','E')),
  CONSTRAINT abstract_is_c_to_e CHECK(evidence <> 'abstract_only' OR grade IN ('C','D','E')),
  CONSTRAINT common_practice_is_d_or_e
    CHECK(evidence <> 'common_practice' OR grade IN ('D','E')),
  CONSTRAINT user_estimate_is_e CHECK(evidence <> 'user_estimate' OR grade = 'E'),
  CONSTRAINT grade_a_needs_second_signature CHECK(grade <> 'A' OR
    (evidence IN ('primary_read','user_measured') AND checked_by IS NOT NULL
     AND checked_by <> entered_by))
) STRICT;

CREATE TABLE composition(
  material_id TEXT NOT NULL REFERENCES material(material_id) ON DELETE CASCADE,
  component TEXT NOT NULL, mass_frac REAL NOT NULL CHECK(mass_frac BETWEEN 0 AND 1),
  basis TEXT NOT NULL CHECK(basis IN ('wet','dry')),
  prov_id INTEGER NOT NULL REFERENCES provenance(prov_id),
  PRIMARY KEY(material_id, component, basis)
) STRICT;

CREATE TABLE import_batch(
  import_id INTEGER PRIMARY KEY, file_name TEXT NOT NULL, sha256 TEXT NOT NULL UNIQUE,
  imported_on TEXT NOT NULL, imported_by TEXT NOT NULL, method TEXT NOT NULL, instrument TEXT,
  calibration TEXT, sample_prep TEXT, rows_ok INTEGER NOT NULL, rows_rejected INTEGER NOT NULL,
  reject_log TEXT
) STRICT;

-- One data set = points OR a model OR a constant, for one quantity of one material, from ONE
-- source. Sources that disagree stay side by side; priority picks one, the rest show the spread.
CREATE TABLE dataset(
  dataset_id TEXT PRIMARY KEY,
  material_id TEXT NOT NULL REFERENCES material(material_id) ON DELETE CASCADE,
  quantity_id TEXT NOT NULL REFERENCES quantity(quantity_id),
  kind TEXT NOT NULL CHECK(kind IN ('points','model','constant')),
  direction TEXT NOT NULL DEFAULT 'iso' CHECK(direction IN
    ('iso','along','across','radial','tangential','thickness')),
  branch TEXT NOT NULL DEFAULT 'na' CHECK(branch IN
    ('na','adsorption','desorption','mean','drying','cure')),
  moisture_basis TEXT NOT NULL CHECK(moisture_basis IN ('dry','wet','none')),
  of_phase TEXT NOT NULL CHECK(of_phase IN ('bulk','particle','skeleton','resin','tissue')),
  bulk_density REAL,
  prov_id INTEGER NOT NULL REFERENCES provenance(prov_id),
  priority INTEGER NOT NULL DEFAULT 100,
  active INTEGER NOT NULL DEFAULT 1 CHECK(active IN (0,1)),
  origin TEXT NOT NULL DEFAULT 'shipped' CHECK(origin IN ('shipped','user')),
  import_id INTEGER REFERENCES import_batch(import_id),
  rel_unc REAL NOT NULL CHECK(rel_unc > 0),
  unc_kind TEXT NOT NULL CHECK(unc_kind IN ('std','expanded2','bound','guess')),
  safety_use INTEGER NOT NULL DEFAULT 0 CHECK(safety_use IN (0,1)), note TEXT,
  CONSTRAINT user_rows_rank_first CHECK(origin <> 'user' OR priority < 100),
  CONSTRAINT shipped_rows_rank_after CHECK(origin <> 'shipped' OR priority >= 100)
) STRICT;
CREATE INDEX dataset_lookup ON dataset(material_id, quantity_id, direction, active, priority);

CREATE TABLE axis_range(
  dataset_id TEXT NOT NULL REFERENCES dataset(dataset_id) ON DELETE CASCADE,
  axis TEXT NOT NULL CHECK(axis IN ('X','T','f','aw','rho','alpha','p')),
  lo REAL NOT NULL, hi REAL NOT NULL,
  low_policy TEXT NOT NULL CHECK(low_policy IN ('refuse','clamp','linear','model','anchor')),
  high_policy TEXT NOT NULL CHECK(high_policy IN ('refuse','clamp','linear','model','anchor')),
  grow REAL NOT NULL DEFAULT 3.0,
  PRIMARY KEY(dataset_id, axis), CHECK(lo <= hi)
) STRICT;

-- value is the SI value; for eps value = eps' and value_im = eps'' (eps = eps' - j eps'').
CREATE TABLE point(
  dataset_id TEXT NOT NULL REFERENCES dataset(dataset_id) ON DELETE CASCADE,
  seq INTEGER NOT NULL,
  X REAL CHECK(X >= 0), T REAL CHECK(T > 0), f REAL CHECK(f > 0), aw REAL CHECK(aw BETWEEN 0 AND 1),
  rho REAL CHECK(rho > 0), alpha REAL CHECK(alpha BETWEEN 0 AND 1),
  value REAL NOT NULL, value_im REAL CHECK(value_im >= 0), u_value REAL, u_im REAL,
  as_printed TEXT, PRIMARY KEY(dataset_id, seq)
) STRICT;

CREATE TABLE model_form(
  form_id TEXT PRIMARY KEY, version INTEGER NOT NULL, formula TEXT NOT NULL,
  inputs TEXT NOT NULL, note TEXT
) STRICT;

-- One constant of a model. Inputs of an estimate from composition often have another origin than
-- the model itself: evidence then says so (NULL = as the data set).
CREATE TABLE model_param(
  dataset_id TEXT NOT NULL REFERENCES dataset(dataset_id) ON DELETE CASCADE,
  name TEXT NOT NULL, value REAL NOT NULL, unit TEXT NOT NULL, u_value REAL, as_printed TEXT,
  evidence TEXT CHECK(evidence IN
    ('primary_read','secondary_two','secondary_one','abstract_only','from_memory',
     'model_derived','common_practice')),
  note TEXT,
  PRIMARY KEY(dataset_id, name)
) STRICT;

CREATE TABLE dataset_model(
  dataset_id TEXT PRIMARY KEY REFERENCES dataset(dataset_id) ON DELETE CASCADE,
  form_id TEXT NOT NULL REFERENCES model_form(form_id)
) STRICT;

CREATE TABLE limit_value(
  limit_id INTEGER PRIMARY KEY,
  material_id TEXT NOT NULL REFERENCES material(material_id) ON DELETE CASCADE,
  kind TEXT NOT NULL CHECK(kind IN
    ('T_product_max','T_cure_max','T_runaway','p_internal_max','X_critical','X_final_min',
     'dTdt_max','dXdt_max','E_field_max')),
  value REAL NOT NULL, unit TEXT NOT NULL, as_printed TEXT,
  cond_X_lo REAL, cond_X_hi REAL, reason TEXT NOT NULL,
  severity TEXT NOT NULL CHECK(severity IN ('quality','damage','fire')),
  prov_id INTEGER NOT NULL REFERENCES provenance(prov_id)
) STRICT;
CREATE TRIGGER limit_not_on_grade_e BEFORE INSERT ON limit_value
WHEN (SELECT grade FROM provenance WHERE prov_id = NEW.prov_id) = 'E'
BEGIN SELECT RAISE(ABORT, 'a limit cannot rest on a value of grade E'); END;

-- band picks one of the three curves of an estimate from composition.
CREATE TABLE golden(
  golden_id TEXT PRIMARY KEY,
  dataset_id TEXT NOT NULL REFERENCES dataset(dataset_id) ON DELETE CASCADE,
  X REAL, T REAL, f REAL, aw REAL, alpha REAL, p REAL,
  band TEXT NOT NULL DEFAULT 'nominal' CHECK(band IN ('low','nominal','high')),
  expect REAL NOT NULL, expect_im REAL, tol_rel REAL NOT NULL CHECK(tol_rel > 0),
  origin TEXT NOT NULL CHECK(origin IN ('printed','computed_by_second_code'))
) STRICT;

CREATE TRIGGER measured_grade_needs_calibration BEFORE INSERT ON dataset
WHEN (SELECT evidence = 'user_measured' AND grade IN ('A','B') FROM provenance
      WHERE prov_id = NEW.prov_id)
 AND (SELECT calibration FROM import_batch WHERE import_id = NEW.import_id) IS NULL
BEGIN SELECT RAISE(ABORT, 'grade A or B of a user measurement needs its calibration record'); END;

CREATE VIEW v_unverified AS
 SELECT d.dataset_id, d.material_id, d.quantity_id, p.evidence, p.grade
 FROM dataset d JOIN provenance p USING(prov_id)
 WHERE p.evidence IN ('from_memory','model_derived','common_practice','user_estimate');

CREATE VIEW v_ready AS
 SELECT m.material_id,
  max(d.quantity_id = 'eps') AS has_eps, max(d.quantity_id = 'dry_heat_capacity') AS has_cp,
  max(d.quantity_id = 'isotherm') AS has_iso
 FROM material m LEFT JOIN dataset d ON d.material_id = m.material_id AND d.active = 1
 GROUP BY m.material_id;
