CREATE TABLE `campaigns` (
	`id` text PRIMARY KEY NOT NULL,
	`project_id` text NOT NULL,
	`code` text NOT NULL,
	`title` text NOT NULL,
	`question` text NOT NULL,
	`plan_id` text NOT NULL,
	`plan_revision` integer NOT NULL,
	`notes` text NOT NULL,
	`stages` text NOT NULL,
	`invented` integer DEFAULT false NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`created_at` text NOT NULL,
	`updated_at` text NOT NULL,
	`deleted_at` text,
	FOREIGN KEY (`project_id`) REFERENCES `projects`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`plan_id`,`plan_revision`) REFERENCES `plan_revisions`(`plan_id`,`number`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `campaigns_plan` ON `campaigns` (`plan_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `campaigns_code` ON `campaigns` (`project_id`,`code`) WHERE deleted_at is null;--> statement-breakpoint
CREATE TABLE `feeds` (
	`id` text PRIMARY KEY NOT NULL,
	`project_id` text NOT NULL,
	`name` text NOT NULL,
	`description` text NOT NULL,
	`heads` text NOT NULL,
	`minerals` text NOT NULL,
	`carbonate` text NOT NULL,
	`moisture` text NOT NULL,
	`p80` text NOT NULL,
	`solid_density` text NOT NULL,
	`invented` integer DEFAULT false NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`created_at` text NOT NULL,
	`updated_at` text NOT NULL,
	`deleted_at` text,
	FOREIGN KEY (`project_id`) REFERENCES `projects`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `feeds_project` ON `feeds` (`project_id`);--> statement-breakpoint
CREATE TABLE `trial_records` (
	`trial_id` text PRIMARY KEY NOT NULL,
	`planned` text NOT NULL,
	`measured` text NOT NULL,
	`charge` text NOT NULL,
	`samples` text NOT NULL,
	`products` text NOT NULL,
	FOREIGN KEY (`trial_id`) REFERENCES `trials`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `trials` (
	`id` text PRIMARY KEY NOT NULL,
	`project_id` text NOT NULL,
	`campaign_id` text NOT NULL,
	`feed_id` text NOT NULL,
	`code` text NOT NULL,
	`code_key` text NOT NULL,
	`kind` text NOT NULL,
	`stage` text NOT NULL,
	`status` text NOT NULL,
	`status_reason` text NOT NULL,
	`operator` text NOT NULL,
	`started_at` text,
	`started_ms` integer,
	`ended_at` text,
	`replicate_of` text,
	`notes` text NOT NULL,
	`invented` integer DEFAULT false NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`created_at` text NOT NULL,
	`updated_at` text NOT NULL,
	`deleted_at` text,
	`recovery_pct` real,
	`recovery_low` real,
	`recovery_high` real,
	`recovery_basis` text,
	`gangue_dissolved_pct` real,
	`selectivity_pct` real,
	`accountability_pct` real,
	`acid_per_tonne` real,
	`reagent_per_kg` real,
	`ph` real,
	`ph_cooled` integer NOT NULL,
	`eh` real,
	`eh_uncertainty` real,
	`temperature_c` real,
	`flags` text NOT NULL,
	`electrode` text,
	`compared` text NOT NULL,
	`formula_version` text NOT NULL,
	FOREIGN KEY (`project_id`) REFERENCES `projects`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`campaign_id`) REFERENCES `campaigns`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`feed_id`) REFERENCES `feeds`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`replicate_of`) REFERENCES `trials`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `trials_code` ON `trials` (`campaign_id`,`code`) WHERE deleted_at is null;--> statement-breakpoint
CREATE INDEX `trials_campaign` ON `trials` (`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_project` ON `trials` (`project_id`);--> statement-breakpoint
CREATE INDEX `trials_feed` ON `trials` (`feed_id`);--> statement-breakpoint
CREATE INDEX `trials_by_code_key` ON `trials` (`code_key`,`id`);--> statement-breakpoint
CREATE INDEX `trials_by_status` ON `trials` (`status`,`id`);--> statement-breakpoint
CREATE INDEX `trials_by_stage` ON `trials` (`stage`,`id`);--> statement-breakpoint
CREATE INDEX `trials_by_operator` ON `trials` (`operator`,`id`);--> statement-breakpoint
CREATE INDEX `trials_by_started_ms` ON `trials` (`started_ms`,`id`);--> statement-breakpoint
CREATE INDEX `trials_by_updated_at` ON `trials` (`updated_at`,`id`);--> statement-breakpoint
CREATE INDEX `trials_by_recovery_pct` ON `trials` (`recovery_pct`,`id`);--> statement-breakpoint
CREATE INDEX `trials_by_gangue_dissolved_pct` ON `trials` (`gangue_dissolved_pct`,`id`);--> statement-breakpoint
CREATE INDEX `trials_by_selectivity_pct` ON `trials` (`selectivity_pct`,`id`);--> statement-breakpoint
CREATE INDEX `trials_by_accountability_pct` ON `trials` (`accountability_pct`,`id`);--> statement-breakpoint
CREATE INDEX `trials_by_acid_per_tonne` ON `trials` (`acid_per_tonne`,`id`);--> statement-breakpoint
CREATE INDEX `trials_by_reagent_per_kg` ON `trials` (`reagent_per_kg`,`id`);--> statement-breakpoint
CREATE INDEX `trials_by_ph` ON `trials` (`ph`,`id`);--> statement-breakpoint
CREATE INDEX `trials_by_eh` ON `trials` (`eh`,`id`);--> statement-breakpoint
CREATE INDEX `trials_by_temperature_c` ON `trials` (`temperature_c`,`id`);