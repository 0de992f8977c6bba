CREATE TABLE `gauge_studies` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`number` text NOT NULL,
	`title` text NOT NULL,
	`instrument_id` integer NOT NULL,
	`quantity` text NOT NULL,
	`unit` text NOT NULL,
	`decimals` integer NOT NULL,
	`lower_limit` real,
	`upper_limit` real,
	`parts` text NOT NULL,
	`persons` text NOT NULL,
	`trials` integer NOT NULL,
	`values` text NOT NULL,
	`note` text NOT NULL,
	`status` text NOT NULL,
	`created_at` text NOT NULL,
	`created_by_id` integer NOT NULL,
	`closed_at` text,
	`closed_by_id` integer,
	`version` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`instrument_id`) REFERENCES `instruments`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`closed_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "gauge_studies_status" CHECK("gauge_studies"."status" in ('open', 'closed'))
);
--> statement-breakpoint
CREATE UNIQUE INDEX `gauge_studies_number_unique` ON `gauge_studies` (`number`);--> statement-breakpoint
CREATE INDEX `gauge_studies_instrument` ON `gauge_studies` (`instrument_id`);