CREATE TABLE `calibration_reminders` (
	`instrument_id` integer NOT NULL,
	`due_on` text NOT NULL,
	`days` integer NOT NULL,
	`sent_at` text NOT NULL,
	PRIMARY KEY(`instrument_id`, `due_on`, `days`),
	FOREIGN KEY (`instrument_id`) REFERENCES `instruments`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `calibrations` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`instrument_id` integer NOT NULL,
	`calibrated_on` text NOT NULL,
	`due_on` text NOT NULL,
	`laboratory` text NOT NULL,
	`certificate_number` text NOT NULL,
	`as_found` text NOT NULL,
	`adjusted` integer NOT NULL,
	`points` text NOT NULL,
	`note` text NOT NULL,
	`file_id` text,
	`recorded_at` text NOT NULL,
	`recorded_by_id` integer NOT NULL,
	FOREIGN KEY (`instrument_id`) REFERENCES `instruments`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`file_id`) REFERENCES `stored_files`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`recorded_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "calibrations_as_found" CHECK("calibrations"."as_found" in ('in-tolerance', 'out-of-tolerance', 'not-recorded')),
	CONSTRAINT "calibrations_days" CHECK("calibrations"."due_on" >= "calibrations"."calibrated_on")
);
--> statement-breakpoint
CREATE INDEX `calibrations_instrument` ON `calibrations` (`instrument_id`,`calibrated_on`);--> statement-breakpoint
CREATE TABLE `instrument_checks` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`instrument_id` integer NOT NULL,
	`day` text NOT NULL,
	`observed` real NOT NULL,
	`reference` real NOT NULL,
	`tolerance` real NOT NULL,
	`passed` integer NOT NULL,
	`at` text NOT NULL,
	`person_id` integer NOT NULL,
	FOREIGN KEY (`instrument_id`) REFERENCES `instruments`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `instrument_checks_day` ON `instrument_checks` (`instrument_id`,`day`);--> statement-breakpoint
CREATE TABLE `instrument_reviews` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`number` text NOT NULL,
	`calibration_id` integer NOT NULL,
	`doubt_from` text,
	`doubt_to` text NOT NULL,
	`opened_at` text NOT NULL,
	`closed_at` text,
	`closed_by_id` integer,
	`conclusion` text,
	`version` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`calibration_id`) REFERENCES `calibrations`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`closed_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `instrument_reviews_number_unique` ON `instrument_reviews` (`number`);--> statement-breakpoint
CREATE UNIQUE INDEX `instrument_reviews_calibrationId_unique` ON `instrument_reviews` (`calibration_id`);--> statement-breakpoint
CREATE TABLE `review_lots` (
	`review_id` integer NOT NULL,
	`lot_id` integer NOT NULL,
	`readings` integer NOT NULL,
	`effect` text,
	`note` text DEFAULT '' NOT NULL,
	`assessed_by_id` integer,
	`assessed_at` text,
	PRIMARY KEY(`review_id`, `lot_id`),
	FOREIGN KEY (`review_id`) REFERENCES `instrument_reviews`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`lot_id`) REFERENCES `lots`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`assessed_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "review_lots_effect" CHECK("review_lots"."effect" in ('none', 'measure-again', 'recall'))
);
--> statement-breakpoint
CREATE TABLE `instrument_ranges` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`instrument_id` integer NOT NULL,
	`position` integer NOT NULL,
	`specification` text NOT NULL,
	`retired_at` text,
	FOREIGN KEY (`instrument_id`) REFERENCES `instruments`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `instrument_ranges_instrument` ON `instrument_ranges` (`instrument_id`);--> statement-breakpoint
CREATE TABLE `lot_conditions` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`lot_id` integer NOT NULL,
	`conditions` text NOT NULL,
	`noted_at` text NOT NULL,
	`noted_by_id` integer NOT NULL,
	FOREIGN KEY (`lot_id`) REFERENCES `lots`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`noted_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `lot_conditions_lot` ON `lot_conditions` (`lot_id`);--> statement-breakpoint
CREATE TABLE `rack_parts` (
	`rack_id` integer NOT NULL,
	`part_id` integer NOT NULL,
	PRIMARY KEY(`rack_id`, `part_id`),
	FOREIGN KEY (`rack_id`) REFERENCES `racks`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`part_id`) REFERENCES `parts`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `rack_tokens` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`rack_id` integer NOT NULL,
	`hash` text NOT NULL,
	`beginning` text NOT NULL,
	`issued_at` text NOT NULL,
	`issued_by_id` integer NOT NULL,
	`last_used_at` text,
	`revoked_at` text,
	`revoked_by_id` integer,
	FOREIGN KEY (`rack_id`) REFERENCES `racks`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`issued_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`revoked_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `rack_tokens_hash_unique` ON `rack_tokens` (`hash`);--> statement-breakpoint
CREATE INDEX `rack_tokens_rack` ON `rack_tokens` (`rack_id`);--> statement-breakpoint
CREATE TABLE `racks` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`name` text NOT NULL,
	`place` text NOT NULL,
	`active` integer DEFAULT true NOT NULL,
	`mapping` text DEFAULT '{}' NOT NULL,
	`version` integer DEFAULT 1 NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `racks_name_unique` ON `racks` (`name`);--> statement-breakpoint
CREATE TABLE `stored_files` (
	`id` text PRIMARY KEY NOT NULL,
	`file_name` text NOT NULL,
	`media_type` text NOT NULL,
	`bytes` integer NOT NULL,
	`sha256` text NOT NULL,
	`received_at` text NOT NULL
);
--> statement-breakpoint
CREATE TABLE `waveforms` (
	`id` text PRIMARY KEY NOT NULL,
	`lot_id` integer NOT NULL,
	`unit_id` integer NOT NULL,
	`characteristic_id` integer,
	`file_id` text NOT NULL,
	`samples_id` text NOT NULL,
	`record` text NOT NULL,
	`uploaded_at` text NOT NULL,
	`uploaded_by_id` integer,
	`rack_id` integer,
	`withdrawn_at` text,
	`withdrawn_by_id` integer,
	`withdraw_reason` text,
	`version` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`lot_id`) REFERENCES `lots`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`unit_id`) REFERENCES `sample_units`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`characteristic_id`) REFERENCES `plan_characteristics`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`file_id`) REFERENCES `stored_files`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`samples_id`) REFERENCES `stored_files`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`uploaded_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`rack_id`) REFERENCES `racks`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`withdrawn_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `waveforms_lot` ON `waveforms` (`lot_id`,`unit_id`);--> statement-breakpoint
DROP TRIGGER plan_characteristics_frozen_update;--> statement-breakpoint
DROP TRIGGER plan_characteristics_frozen_delete;--> statement-breakpoint
DROP TRIGGER plan_characteristics_frozen_insert;--> statement-breakpoint
DROP TRIGGER plan_class_aqls_frozen_insert;--> statement-breakpoint
DROP TRIGGER plan_class_aqls_frozen_update;--> statement-breakpoint
DROP TRIGGER plan_class_aqls_frozen_delete;--> statement-breakpoint
CREATE TABLE `__new_plan_revisions` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`plan_id` integer NOT NULL,
	`revision` integer NOT NULL,
	`status` text NOT NULL,
	`level` text NOT NULL,
	`decision_rule` text DEFAULT 'simple' NOT NULL,
	`coverage_factor` real DEFAULT 2 NOT NULL,
	`warm_up_minutes` integer,
	`change_note` text NOT NULL,
	`author_id` integer NOT NULL,
	`approver_id` integer,
	`created_at` text NOT NULL,
	`submitted_at` text,
	`effective_at` text,
	`retired_at` text,
	`version` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`plan_id`) REFERENCES `plans`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`author_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`approver_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "plan_revisions_status" CHECK("__new_plan_revisions"."status" in ('draft', 'in-review', 'effective', 'retired')),
	CONSTRAINT "plan_revisions_level" CHECK("__new_plan_revisions"."level" in ('S-1', 'S-2', 'S-3', 'S-4', 'I', 'II', 'III')),
	CONSTRAINT "plan_revisions_rule" CHECK("__new_plan_revisions"."decision_rule" in ('simple', 'guarded', 'non-binary'))
);
--> statement-breakpoint
INSERT INTO `__new_plan_revisions`("id", "plan_id", "revision", "status", "level", "decision_rule", "coverage_factor", "warm_up_minutes", "change_note", "author_id", "approver_id", "created_at", "submitted_at", "effective_at", "retired_at", "version") SELECT "id", "plan_id", "revision", "status", "level", "decision_rule", 2, NULL, "change_note", "author_id", "approver_id", "created_at", "submitted_at", "effective_at", "retired_at", "version" FROM `plan_revisions`;--> statement-breakpoint
DROP TABLE `plan_revisions`;--> statement-breakpoint
ALTER TABLE `__new_plan_revisions` RENAME TO `plan_revisions`;--> statement-breakpoint
CREATE UNIQUE INDEX `plan_revisions_number` ON `plan_revisions` (`plan_id`,`revision`);--> statement-breakpoint
ALTER TABLE `instruments` ADD `check_name` text;--> statement-breakpoint
ALTER TABLE `instruments` ADD `check_unit` text;--> statement-breakpoint
ALTER TABLE `instruments` ADD `check_value` real;--> statement-breakpoint
ALTER TABLE `instruments` ADD `check_tolerance` real;--> statement-breakpoint
ALTER TABLE `sample_units` ADD `ruling` text;--> statement-breakpoint
ALTER TABLE `sample_units` ADD `ruling_reason` text;--> statement-breakpoint
ALTER TABLE `sample_units` ADD `ruled_by_id` integer REFERENCES people(id);--> statement-breakpoint
ALTER TABLE `sample_units` ADD `ruled_at` text;--> statement-breakpoint
ALTER TABLE `parts` ADD `expected` text;--> statement-breakpoint
ALTER TABLE `readings` ADD `rack_id` integer REFERENCES racks(id);--> statement-breakpoint
ALTER TABLE `readings` ADD `range_id` integer REFERENCES instrument_ranges(id);--> statement-breakpoint
ALTER TABLE `readings` ADD `expanded_uncertainty` real;--> statement-breakpoint
ALTER TABLE `readings` ADD `waveform_id` text REFERENCES waveforms(id);--> statement-breakpoint
ALTER TABLE `readings` ADD `question` text;--> statement-breakpoint
ALTER TABLE `site` ADD `daily_checks` integer DEFAULT false NOT NULL;--> statement-breakpoint
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
--> statement-breakpoint
DROP TRIGGER readings_only_withdrawn;--> statement-breakpoint
CREATE TRIGGER readings_only_withdrawn BEFORE UPDATE ON readings
WHEN OLD.withdrawn_at IS NOT NULL
  OR NEW.id IS NOT OLD.id OR NEW.lot_id IS NOT OLD.lot_id OR NEW.unit_id IS NOT OLD.unit_id
  OR NEW.characteristic_id IS NOT OLD.characteristic_id OR NEW.attempt IS NOT OLD.attempt
  OR NEW.value IS NOT OLD.value OR NEW.pass IS NOT OLD.pass OR NEW.entry IS NOT OLD.entry
  OR NEW.instrument_id IS NOT OLD.instrument_id OR NEW.taken_by_id IS NOT OLD.taken_by_id
  OR NEW.taken_at IS NOT OLD.taken_at OR NEW.received_at IS NOT OLD.received_at
  OR NEW.repeat_reason IS NOT OLD.repeat_reason OR NEW.repeat_note IS NOT OLD.repeat_note
  OR NEW.note IS NOT OLD.note OR NEW.rack_import_id IS NOT OLD.rack_import_id
  OR NEW.rack_id IS NOT OLD.rack_id OR NEW.range_id IS NOT OLD.range_id
  OR NEW.expanded_uncertainty IS NOT OLD.expanded_uncertainty OR NEW.waveform_id IS NOT OLD.waveform_id
  OR (NEW.question IS NOT OLD.question AND json_extract(OLD.question, '$.given.answer') IS NOT 'open')
BEGIN SELECT RAISE(ABORT, 'a kept reading may be withdrawn or its question answered, nothing else'); END;
--> statement-breakpoint
CREATE TRIGGER instrument_ranges_only_retired BEFORE UPDATE ON instrument_ranges
WHEN OLD.retired_at IS NOT NULL OR NEW.id IS NOT OLD.id OR NEW.instrument_id IS NOT OLD.instrument_id
  OR NEW.specification IS NOT OLD.specification
BEGIN SELECT RAISE(ABORT, 'readings rest on a range; it is retired, never altered'); END;
--> statement-breakpoint
CREATE TRIGGER instrument_ranges_no_delete BEFORE DELETE ON instrument_ranges
BEGIN SELECT RAISE(ABORT, 'readings rest on a range; it is retired, never removed'); END;
--> statement-breakpoint
CREATE TRIGGER calibrations_only_file BEFORE UPDATE ON calibrations
WHEN OLD.file_id IS NOT NULL
  OR NEW.id IS NOT OLD.id OR NEW.instrument_id IS NOT OLD.instrument_id OR NEW.calibrated_on IS NOT OLD.calibrated_on
  OR NEW.due_on IS NOT OLD.due_on OR NEW.laboratory IS NOT OLD.laboratory
  OR NEW.certificate_number IS NOT OLD.certificate_number OR NEW.as_found IS NOT OLD.as_found
  OR NEW.adjusted IS NOT OLD.adjusted OR NEW.points IS NOT OLD.points OR NEW.note IS NOT OLD.note
  OR NEW.recorded_at IS NOT OLD.recorded_at OR NEW.recorded_by_id IS NOT OLD.recorded_by_id
BEGIN SELECT RAISE(ABORT, 'a recorded calibration is never altered; its certificate is attached once'); END;
--> statement-breakpoint
CREATE TRIGGER calibrations_no_delete BEFORE DELETE ON calibrations
BEGIN SELECT RAISE(ABORT, 'a recorded calibration is never removed'); END;
--> statement-breakpoint
CREATE TRIGGER instrument_checks_no_update BEFORE UPDATE ON instrument_checks
BEGIN SELECT RAISE(ABORT, 'a check of an instrument is never altered'); END;
--> statement-breakpoint
CREATE TRIGGER instrument_checks_no_delete BEFORE DELETE ON instrument_checks
BEGIN SELECT RAISE(ABORT, 'a check of an instrument is never removed'); END;
--> statement-breakpoint
CREATE TRIGGER lot_conditions_no_update BEFORE UPDATE ON lot_conditions
BEGIN SELECT RAISE(ABORT, 'noted conditions stay on record'); END;
--> statement-breakpoint
CREATE TRIGGER lot_conditions_no_delete BEFORE DELETE ON lot_conditions
BEGIN SELECT RAISE(ABORT, 'noted conditions stay on record'); END;
--> statement-breakpoint
CREATE TRIGGER waveforms_no_delete BEFORE DELETE ON waveforms
BEGIN SELECT RAISE(ABORT, 'a waveform is withdrawn, never removed'); END;
