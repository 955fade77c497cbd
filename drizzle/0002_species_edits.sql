CREATE TABLE `species_edits` (
	`number` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`species_id` text NOT NULL,
	`row` text NOT NULL,
	`citation` text NOT NULL,
	`extrapolation` text,
	`reason` text NOT NULL,
	`author_id` text NOT NULL,
	`created_at` text NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`reverted_at` text,
	`reverted_by` text,
	`revert_reason` text DEFAULT '' NOT NULL,
	FOREIGN KEY (`author_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`reverted_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `species_edits_species` ON `species_edits` (`species_id`);--> statement-breakpoint
ALTER TABLE `chemistry_versions` ADD `curated_version` text;--> statement-breakpoint
ALTER TABLE `chemistry_versions` ADD `edited` text DEFAULT '[]' NOT NULL;