CREATE TRIGGER audit_entries_no_update BEFORE UPDATE ON audit_entries
BEGIN SELECT RAISE(ABORT, 'audit entries are append-only'); END;
--> statement-breakpoint
CREATE TRIGGER audit_entries_no_delete BEFORE DELETE ON audit_entries
BEGIN SELECT RAISE(ABORT, 'audit entries are append-only'); END;
--> statement-breakpoint
CREATE TRIGGER certificates_no_update BEFORE UPDATE ON certificates
BEGIN SELECT RAISE(ABORT, 'an issued certificate is never altered'); END;
--> statement-breakpoint
CREATE TRIGGER certificates_no_delete BEFORE DELETE ON certificates
BEGIN SELECT RAISE(ABORT, 'an issued certificate is never removed'); END;
--> statement-breakpoint
CREATE TRIGGER certificate_files_no_update BEFORE UPDATE ON certificate_files
BEGIN SELECT RAISE(ABORT, 'the file of a certificate is never altered'); END;
--> statement-breakpoint
CREATE TRIGGER certificate_files_no_delete BEFORE DELETE ON certificate_files
BEGIN SELECT RAISE(ABORT, 'the file of a certificate is never removed'); END;
--> statement-breakpoint
CREATE TRIGGER certificate_statuses_no_update BEFORE UPDATE ON certificate_statuses
BEGIN SELECT RAISE(ABORT, 'the status of a certificate is append-only'); END;
--> statement-breakpoint
CREATE TRIGGER certificate_statuses_no_delete BEFORE DELETE ON certificate_statuses
BEGIN SELECT RAISE(ABORT, 'the status of a certificate is append-only'); END;
--> statement-breakpoint
CREATE TRIGGER readings_no_delete BEFORE DELETE ON readings
BEGIN SELECT RAISE(ABORT, 'a kept reading is never removed'); END;
--> statement-breakpoint
CREATE TRIGGER readings_only_withdrawn BEFORE UPDATE ON readings
WHEN OLD.withdrawn_at IS NOT NULL
  OR NEW.id IS NOT OLD.id OR NEW.lot_id IS NOT OLD.lot_id OR NEW.unit_id IS NOT OLD.unit_id
  OR NEW.characteristic_id IS NOT OLD.characteristic_id OR NEW.attempt IS NOT OLD.attempt
  OR NEW.value IS NOT OLD.value OR NEW.pass IS NOT OLD.pass OR NEW.entry IS NOT OLD.entry
  OR NEW.instrument_id IS NOT OLD.instrument_id OR NEW.taken_by_id IS NOT OLD.taken_by_id
  OR NEW.taken_at IS NOT OLD.taken_at OR NEW.received_at IS NOT OLD.received_at
  OR NEW.repeat_reason IS NOT OLD.repeat_reason OR NEW.repeat_note IS NOT OLD.repeat_note
  OR NEW.note IS NOT OLD.note OR NEW.rack_import_id IS NOT OLD.rack_import_id
BEGIN SELECT RAISE(ABORT, 'a kept reading may be withdrawn, nothing else'); END;
--> statement-breakpoint
CREATE TRIGGER plan_characteristics_frozen_update BEFORE UPDATE ON plan_characteristics
WHEN (SELECT status FROM plan_revisions WHERE id = OLD.revision_id) <> 'draft'
BEGIN SELECT RAISE(ABORT, 'a plan is revised, never edited'); END;
--> statement-breakpoint
CREATE TRIGGER plan_characteristics_frozen_delete BEFORE DELETE ON plan_characteristics
WHEN (SELECT status FROM plan_revisions WHERE id = OLD.revision_id) <> 'draft'
BEGIN SELECT RAISE(ABORT, 'a plan is revised, never edited'); END;
--> statement-breakpoint
CREATE TRIGGER plan_characteristics_frozen_insert BEFORE INSERT ON plan_characteristics
WHEN (SELECT status FROM plan_revisions WHERE id = NEW.revision_id) <> 'draft'
BEGIN SELECT RAISE(ABORT, 'a plan is revised, never edited'); END;
--> statement-breakpoint
CREATE TRIGGER plan_class_aqls_frozen_insert BEFORE INSERT ON plan_class_aqls
WHEN (SELECT status FROM plan_revisions WHERE id = NEW.revision_id) <> 'draft'
BEGIN SELECT RAISE(ABORT, 'a plan is revised, never edited'); END;
--> statement-breakpoint
CREATE TRIGGER plan_class_aqls_frozen_update BEFORE UPDATE ON plan_class_aqls
WHEN (SELECT status FROM plan_revisions WHERE id = OLD.revision_id) <> 'draft'
BEGIN SELECT RAISE(ABORT, 'a plan is revised, never edited'); END;
--> statement-breakpoint
CREATE TRIGGER plan_class_aqls_frozen_delete BEFORE DELETE ON plan_class_aqls
WHEN (SELECT status FROM plan_revisions WHERE id = OLD.revision_id) <> 'draft'
BEGIN SELECT RAISE(ABORT, 'a plan is revised, never edited'); END;
