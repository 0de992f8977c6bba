CREATE TABLE `audit_entries` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`at` text NOT NULL,
	`person_id` integer,
	`actor` text NOT NULL,
	`action` text NOT NULL,
	`subject` text NOT NULL,
	`subject_id` text NOT NULL,
	`before` text,
	`after` text,
	`previous_hash` text NOT NULL,
	`hash` text NOT NULL,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `audit_entries_subject` ON `audit_entries` (`subject`,`subject_id`);--> statement-breakpoint
CREATE INDEX `audit_entries_person` ON `audit_entries` (`person_id`);--> statement-breakpoint
CREATE TABLE `certificate_files` (
	`certificate_id` integer PRIMARY KEY NOT NULL,
	`sha256` text NOT NULL,
	`bytes` blob NOT NULL,
	`made_at` text NOT NULL,
	FOREIGN KEY (`certificate_id`) REFERENCES `certificates`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `certificate_statuses` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`certificate_id` integer NOT NULL,
	`status` text NOT NULL,
	`at` text NOT NULL,
	`reason` text,
	FOREIGN KEY (`certificate_id`) REFERENCES `certificates`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "certificate_statuses_status" CHECK("certificate_statuses"."status" in ('issuing', 'valid', 'superseded', 'revoked'))
);
--> statement-breakpoint
CREATE INDEX `certificate_statuses_certificate` ON `certificate_statuses` (`certificate_id`);--> statement-breakpoint
CREATE TABLE `certificates` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`number` text NOT NULL,
	`lot_id` integer NOT NULL,
	`data` text NOT NULL,
	`data_digest` text NOT NULL,
	`units_released` integer NOT NULL,
	`issued_at` text NOT NULL,
	`issued_by_id` integer NOT NULL,
	FOREIGN KEY (`lot_id`) REFERENCES `lots`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`issued_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `certificates_number_unique` ON `certificates` (`number`);--> statement-breakpoint
CREATE TABLE `instruments` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`asset_number` text NOT NULL,
	`kind` text NOT NULL,
	`description` text NOT NULL,
	`serial_number` text NOT NULL,
	`place` text NOT NULL,
	`calibration_due` text NOT NULL,
	`status` text NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	CONSTRAINT "instruments_kind" CHECK("instruments"."kind" in ('multimeter', 'oscilloscope', 'electronic-load', 'insulation-tester', 'power-meter', 'thermometer', 'rule')),
	CONSTRAINT "instruments_status" CHECK("instruments"."status" in ('in-service', 'withdrawn'))
);
--> statement-breakpoint
CREATE UNIQUE INDEX `instruments_assetNumber_unique` ON `instruments` (`asset_number`);--> statement-breakpoint
CREATE TABLE `lot_groups` (
	`lot_id` integer NOT NULL,
	`position` integer NOT NULL,
	`group` text NOT NULL,
	PRIMARY KEY(`lot_id`, `position`),
	FOREIGN KEY (`lot_id`) REFERENCES `lots`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `lots` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`number` text NOT NULL,
	`status` text NOT NULL,
	`part_id` integer NOT NULL,
	`supplier_id` integer NOT NULL,
	`delivery_number` text NOT NULL,
	`order_number` text NOT NULL,
	`counted_quantity` integer NOT NULL,
	`stated_quantity` integer NOT NULL,
	`date_code` text NOT NULL,
	`cartons` integer NOT NULL,
	`place` text NOT NULL,
	`note` text NOT NULL,
	`needed_by` text,
	`arrived_at` text NOT NULL,
	`booked_by_id` integer NOT NULL,
	`cancel_reason` text,
	`revision_id` integer,
	`severity` text,
	`sample_size` integer,
	`seed` integer,
	`drawn_at` text,
	`drawn_by_id` integer,
	`stopped` integer DEFAULT false NOT NULL,
	`units_judged` integer DEFAULT 0 NOT NULL,
	`submitted_at` text,
	`submitted_by_id` integer,
	`verdict` text,
	`decided_at` text,
	`decided_by_id` integer,
	`decision_reason` text,
	`decision_note` text,
	`hold_reason` text,
	`version` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`part_id`) REFERENCES `parts`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`supplier_id`) REFERENCES `suppliers`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`booked_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`revision_id`) REFERENCES `plan_revisions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`drawn_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`submitted_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`decided_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "lots_status" CHECK("lots"."status" in ('arrived', 'drawn', 'measuring', 'submitted', 'released', 'on-hold', 'cancelled')),
	CONSTRAINT "lots_severity" CHECK("lots"."severity" in ('normal', 'tightened', 'reduced')),
	CONSTRAINT "lots_verdict" CHECK("lots"."verdict" in ('accepted', 'rejected')),
	CONSTRAINT "lots_counted" CHECK("lots"."counted_quantity" > 0),
	CONSTRAINT "lots_cartons" CHECK("lots"."cartons" between 1 and "lots"."counted_quantity"),
	CONSTRAINT "lots_drawn" CHECK("lots"."status" in ('arrived', 'cancelled') or ("lots"."revision_id" is not null and "lots"."severity" is not null and "lots"."seed" is not null and "lots"."drawn_at" is not null)),
	CONSTRAINT "lots_released" CHECK("lots"."status" <> 'released' or "lots"."verdict" = 'accepted')
);
--> statement-breakpoint
CREATE UNIQUE INDEX `lots_number_unique` ON `lots` (`number`);--> statement-breakpoint
CREATE INDEX `lots_station` ON `lots` (`status`,`arrived_at`);--> statement-breakpoint
CREATE INDEX `lots_decided` ON `lots` (`supplier_id`,`part_id`,`decided_at`);--> statement-breakpoint
CREATE TABLE `sample_units` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`lot_id` integer NOT NULL,
	`unit` integer NOT NULL,
	`position` integer NOT NULL,
	`carton` integer NOT NULL,
	`set_aside_reason` text,
	FOREIGN KEY (`lot_id`) REFERENCES `lots`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `sample_units_unit` ON `sample_units` (`lot_id`,`unit`);--> statement-breakpoint
CREATE UNIQUE INDEX `sample_units_position` ON `sample_units` (`lot_id`,`position`);--> statement-breakpoint
CREATE TABLE `message_attempts` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`message_id` integer NOT NULL,
	`at` text NOT NULL,
	`outcome` text NOT NULL,
	`detail` text NOT NULL,
	FOREIGN KEY (`message_id`) REFERENCES `messages`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `message_attempts_message` ON `message_attempts` (`message_id`);--> statement-breakpoint
CREATE TABLE `messages` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`message_id` text NOT NULL,
	`event` text NOT NULL,
	`nonconformance_id` integer,
	`recipients` text NOT NULL,
	`subject` text NOT NULL,
	`html` text NOT NULL,
	`text` text NOT NULL,
	`status` text NOT NULL,
	`queued_at` text NOT NULL,
	`next_attempt_at` text,
	`sent_at` text,
	FOREIGN KEY (`nonconformance_id`) REFERENCES `nonconformances`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "messages_status" CHECK("messages"."status" in ('queued', 'sent', 'failed'))
);
--> statement-breakpoint
CREATE UNIQUE INDEX `messages_messageId_unique` ON `messages` (`message_id`);--> statement-breakpoint
CREATE INDEX `messages_due` ON `messages` (`status`,`next_attempt_at`);--> statement-breakpoint
CREATE TABLE `received_messages` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`message_id` text NOT NULL,
	`sender` text NOT NULL,
	`recipients` text NOT NULL,
	`subject` text NOT NULL,
	`html` text NOT NULL,
	`text` text NOT NULL,
	`received_at` text NOT NULL
);
--> statement-breakpoint
CREATE TABLE `nonconformances` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`number` text NOT NULL,
	`lot_id` integer NOT NULL,
	`status` text NOT NULL,
	`summary` text NOT NULL,
	`failures` text NOT NULL,
	`containment` text NOT NULL,
	`opened_at` text NOT NULL,
	`opened_by_id` integer NOT NULL,
	FOREIGN KEY (`lot_id`) REFERENCES `lots`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`opened_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "nonconformances_status" CHECK("nonconformances"."status" in ('open'))
);
--> statement-breakpoint
CREATE UNIQUE INDEX `nonconformances_number_unique` ON `nonconformances` (`number`);--> statement-breakpoint
CREATE UNIQUE INDEX `nonconformances_lotId_unique` ON `nonconformances` (`lot_id`);--> statement-breakpoint
CREATE TABLE `parts` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`number` text NOT NULL,
	`name` text NOT NULL,
	`form` text NOT NULL,
	`topology` text NOT NULL,
	`line_volts` real NOT NULL,
	`line_hertz` integer NOT NULL,
	`rated_volts` real NOT NULL,
	`rated_amperes` real NOT NULL,
	`secondary_peak_volts` real,
	`source_ohms` real,
	`diode_drop_volts` real,
	`filter_farads` real,
	`filter_tolerance` real,
	`filter_esr_ohms` real,
	`active` integer DEFAULT true NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	CONSTRAINT "parts_form" CHECK("parts"."form" in ('wall-adapter', 'desktop-adapter', 'open-frame')),
	CONSTRAINT "parts_topology" CHECK("parts"."topology" in ('half-wave', 'centre-tap', 'bridge', 'linear-regulated', 'switch-mode')),
	CONSTRAINT "parts_line_hertz" CHECK("parts"."line_hertz" in (50, 60))
);
--> statement-breakpoint
CREATE UNIQUE INDEX `parts_number_unique` ON `parts` (`number`);--> statement-breakpoint
CREATE TABLE `people` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`name` text NOT NULL,
	`email` text NOT NULL,
	`stamp_number` text,
	`password_hash` text,
	`active` integer DEFAULT true NOT NULL,
	`last_sign_in_at` text,
	`version` integer DEFAULT 1 NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `people_email_unique` ON `people` (`email`);--> statement-breakpoint
CREATE UNIQUE INDEX `people_stampNumber_unique` ON `people` (`stamp_number`);--> statement-breakpoint
CREATE TABLE `person_roles` (
	`person_id` integer NOT NULL,
	`role` text NOT NULL,
	PRIMARY KEY(`person_id`, `role`),
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "person_roles_role" CHECK("person_roles"."role" in ('receiving', 'inspector', 'quality', 'engineering', 'auditor', 'admin'))
);
--> statement-breakpoint
CREATE TABLE `plan_characteristics` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`revision_id` integer NOT NULL,
	`position` integer NOT NULL,
	`key` text NOT NULL,
	`content` text NOT NULL,
	FOREIGN KEY (`revision_id`) REFERENCES `plan_revisions`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `plan_characteristics_key` ON `plan_characteristics` (`revision_id`,`key`);--> statement-breakpoint
CREATE UNIQUE INDEX `plan_characteristics_position` ON `plan_characteristics` (`revision_id`,`position`);--> statement-breakpoint
CREATE TABLE `plan_class_aqls` (
	`revision_id` integer NOT NULL,
	`class` text NOT NULL,
	`aql` text NOT NULL,
	PRIMARY KEY(`revision_id`, `class`),
	FOREIGN KEY (`revision_id`) REFERENCES `plan_revisions`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "plan_class_aqls_class" CHECK("plan_class_aqls"."class" in ('critical', 'major', 'minor')),
	CONSTRAINT "plan_class_aqls_aql" CHECK("plan_class_aqls"."aql" in ('0.010', '0.015', '0.025', '0.040', '0.065', '0.10', '0.15', '0.25', '0.40', '0.65', '1.0', '1.5', '2.5', '4.0', '6.5', '10', '15', '25', '40', '65', '100', '150', '250', '400', '650', '1000'))
);
--> statement-breakpoint
CREATE TABLE `plan_revisions` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`plan_id` integer NOT NULL,
	`revision` integer NOT NULL,
	`status` text NOT NULL,
	`level` text NOT NULL,
	`decision_rule` text DEFAULT 'simple' NOT NULL,
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
	CONSTRAINT "plan_revisions_status" CHECK("plan_revisions"."status" in ('draft', 'in-review', 'effective', 'retired')),
	CONSTRAINT "plan_revisions_level" CHECK("plan_revisions"."level" in ('S-1', 'S-2', 'S-3', 'S-4', 'I', 'II', 'III')),
	CONSTRAINT "plan_revisions_rule" CHECK("plan_revisions"."decision_rule" in ('simple'))
);
--> statement-breakpoint
CREATE UNIQUE INDEX `plan_revisions_number` ON `plan_revisions` (`plan_id`,`revision`);--> statement-breakpoint
CREATE TABLE `plans` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`number` text NOT NULL,
	`part_id` integer NOT NULL,
	FOREIGN KEY (`part_id`) REFERENCES `parts`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `plans_number_unique` ON `plans` (`number`);--> statement-breakpoint
CREATE UNIQUE INDEX `plans_partId_unique` ON `plans` (`part_id`);--> statement-breakpoint
CREATE TABLE `rack_imports` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`lot_id` integer NOT NULL,
	`file_name` text NOT NULL,
	`sha256` text NOT NULL,
	`text` text NOT NULL,
	`rows` integer NOT NULL,
	`imported_at` text NOT NULL,
	`imported_by_id` integer NOT NULL,
	FOREIGN KEY (`lot_id`) REFERENCES `lots`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`imported_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `readings` (
	`id` text PRIMARY KEY NOT NULL,
	`lot_id` integer NOT NULL,
	`unit_id` integer NOT NULL,
	`characteristic_id` integer NOT NULL,
	`attempt` integer NOT NULL,
	`value` real,
	`pass` integer,
	`entry` text,
	`instrument_id` integer,
	`note` text NOT NULL,
	`repeat_reason` text,
	`repeat_note` text,
	`taken_by_id` integer,
	`rack_import_id` integer,
	`taken_at` text NOT NULL,
	`received_at` text NOT NULL,
	`withdrawn_at` text,
	`withdrawn_by_id` integer,
	FOREIGN KEY (`lot_id`) REFERENCES `lots`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`unit_id`) REFERENCES `sample_units`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`characteristic_id`) REFERENCES `plan_characteristics`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`instrument_id`) REFERENCES `instruments`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`taken_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`rack_import_id`) REFERENCES `rack_imports`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`withdrawn_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "readings_one_value" CHECK(("readings"."value" is null) <> ("readings"."pass" is null)),
	CONSTRAINT "readings_repeat_reason" CHECK("readings"."repeat_reason" in ('contact', 'wrong-range', 'warm-up', 'wrong-load', 'typing', 'other')),
	CONSTRAINT "readings_attempt" CHECK("readings"."attempt" between 1 and 3)
);
--> statement-breakpoint
CREATE INDEX `readings_lot` ON `readings` (`lot_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `readings_attempt_once` ON `readings` (`unit_id`,`characteristic_id`,`attempt`) WHERE "readings"."withdrawn_at" is null;--> statement-breakpoint
CREATE TABLE `one_time_links` (
	`token_hash` text PRIMARY KEY NOT NULL,
	`purpose` text NOT NULL,
	`person_id` integer,
	`issued_at` text NOT NULL,
	`expires_at` text NOT NULL,
	`used_at` text,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "one_time_links_purpose" CHECK("one_time_links"."purpose" in ('first-admin', 'set-password'))
);
--> statement-breakpoint
CREATE TABLE `refresh_tokens` (
	`token_hash` text PRIMARY KEY NOT NULL,
	`session_id` text NOT NULL,
	`issued_at` text NOT NULL,
	`used_at` text,
	FOREIGN KEY (`session_id`) REFERENCES `sessions`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `sessions` (
	`id` text PRIMARY KEY NOT NULL,
	`person_id` integer NOT NULL,
	`keep` integer NOT NULL,
	`started_at` text NOT NULL,
	`expires_at` text NOT NULL,
	`ended_at` text,
	`end_reason` text,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `sessions_person` ON `sessions` (`person_id`);--> statement-breakpoint
CREATE TABLE `number_series` (
	`kind` text NOT NULL,
	`year` integer NOT NULL,
	`last` integer NOT NULL,
	PRIMARY KEY(`kind`, `year`)
);
--> statement-breakpoint
CREATE TABLE `site` (
	`id` integer PRIMARY KEY DEFAULT 1 NOT NULL,
	`name` text NOT NULL,
	`department` text NOT NULL,
	`address` text NOT NULL,
	`engineering_list` text NOT NULL,
	`waiting_target_hours` real NOT NULL,
	`approve_own_plans` integer NOT NULL,
	`release_own_readings` integer NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	CONSTRAINT "site_single" CHECK("site"."id" = 1)
);
--> statement-breakpoint
CREATE TABLE `characteristic_summaries` (
	`lot_id` integer NOT NULL,
	`key` text NOT NULL,
	`n` integer NOT NULL,
	`found` integer NOT NULL,
	`min` real,
	`mean` real,
	`max` real,
	`s` real,
	PRIMARY KEY(`lot_id`, `key`),
	FOREIGN KEY (`lot_id`) REFERENCES `lots`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `lot_summaries` (
	`lot_id` integer PRIMARY KEY NOT NULL,
	`month` text NOT NULL,
	`decided_at` text NOT NULL,
	`supplier_id` integer NOT NULL,
	`part_id` integer NOT NULL,
	`verdict` text NOT NULL,
	`lot_size` integer NOT NULL,
	`units_judged` integer NOT NULL,
	`units_conforming` integer NOT NULL,
	`critical_units` integer NOT NULL,
	`major_units` integer NOT NULL,
	`minor_units` integer NOT NULL,
	`units_released` integer NOT NULL,
	FOREIGN KEY (`lot_id`) REFERENCES `lots`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`supplier_id`) REFERENCES `suppliers`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`part_id`) REFERENCES `parts`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `lot_summaries_month` ON `lot_summaries` (`month`);--> statement-breakpoint
CREATE TABLE `suppliers` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`code` text NOT NULL,
	`name` text NOT NULL,
	`address` text NOT NULL,
	`contact_name` text NOT NULL,
	`contact_email` text,
	`active` integer DEFAULT true NOT NULL,
	`version` integer DEFAULT 1 NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `suppliers_code_unique` ON `suppliers` (`code`);--> statement-breakpoint
CREATE UNIQUE INDEX `suppliers_name_unique` ON `suppliers` (`name`);