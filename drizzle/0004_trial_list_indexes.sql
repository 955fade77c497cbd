DROP INDEX `trials_by_code_key`;--> statement-breakpoint
DROP INDEX `trials_by_status`;--> statement-breakpoint
DROP INDEX `trials_by_stage`;--> statement-breakpoint
DROP INDEX `trials_by_operator`;--> statement-breakpoint
DROP INDEX `trials_by_started_ms`;--> statement-breakpoint
DROP INDEX `trials_by_updated_at`;--> statement-breakpoint
DROP INDEX `trials_by_recovery_pct`;--> statement-breakpoint
DROP INDEX `trials_by_gangue_dissolved_pct`;--> statement-breakpoint
DROP INDEX `trials_by_selectivity_pct`;--> statement-breakpoint
DROP INDEX `trials_by_accountability_pct`;--> statement-breakpoint
DROP INDEX `trials_by_acid_per_tonne`;--> statement-breakpoint
DROP INDEX `trials_by_reagent_per_kg`;--> statement-breakpoint
DROP INDEX `trials_by_ph`;--> statement-breakpoint
DROP INDEX `trials_by_eh`;--> statement-breakpoint
DROP INDEX `trials_by_temperature_c`;--> statement-breakpoint
CREATE INDEX `trials_listed` ON `trials` (`deleted_at`,`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_by_code_key` ON `trials` (`code_key`,`id`,`deleted_at`,`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_by_status` ON `trials` (`status`,`id`,`deleted_at`,`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_by_stage` ON `trials` (`stage`,`id`,`deleted_at`,`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_by_operator` ON `trials` (`operator`,`id`,`deleted_at`,`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_by_started_ms` ON `trials` (`started_ms`,`id`,`deleted_at`,`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_by_updated_at` ON `trials` (`updated_at`,`id`,`deleted_at`,`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_by_recovery_pct` ON `trials` (`recovery_pct`,`id`,`deleted_at`,`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_by_gangue_dissolved_pct` ON `trials` (`gangue_dissolved_pct`,`id`,`deleted_at`,`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_by_selectivity_pct` ON `trials` (`selectivity_pct`,`id`,`deleted_at`,`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_by_accountability_pct` ON `trials` (`accountability_pct`,`id`,`deleted_at`,`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_by_acid_per_tonne` ON `trials` (`acid_per_tonne`,`id`,`deleted_at`,`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_by_reagent_per_kg` ON `trials` (`reagent_per_kg`,`id`,`deleted_at`,`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_by_ph` ON `trials` (`ph`,`id`,`deleted_at`,`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_by_eh` ON `trials` (`eh`,`id`,`deleted_at`,`campaign_id`);--> statement-breakpoint
CREATE INDEX `trials_by_temperature_c` ON `trials` (`temperature_c`,`id`,`deleted_at`,`campaign_id`);