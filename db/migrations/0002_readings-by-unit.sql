DROP INDEX `readings_lot`;--> statement-breakpoint
CREATE INDEX `readings_lot` ON `readings` (`lot_id`,`unit_id`);