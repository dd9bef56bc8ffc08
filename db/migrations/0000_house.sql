ALTER DATABASE CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci;--> statement-breakpoint
CREATE TABLE `blend_lines` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`blend_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`position` smallint NOT NULL,
	`material_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`material_name` varchar(160) NOT NULL,
	`share` decimal(16,14) NOT NULL,
	`impact` decimal(16,14) NOT NULL,
	CONSTRAINT `blend_lines_team_id_blend_id_position_pk` PRIMARY KEY(`team_id`,`blend_id`,`position`)
);
--> statement-breakpoint
CREATE TABLE `blends` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`id` char(26) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(160) NOT NULL,
	`note` varchar(2000),
	`target_name` varchar(160) NOT NULL,
	`status` varchar(12) character set ascii collate ascii_bin NOT NULL,
	`distance` double NOT NULL,
	`cost_per_kg` double NOT NULL,
	`request` longtext character set utf8mb4 collate utf8mb4_bin NOT NULL,
	`problem` longtext character set utf8mb4 collate utf8mb4_bin NOT NULL,
	`solution` longtext character set utf8mb4 collate utf8mb4_bin NOT NULL,
	`certificate` longtext character set utf8mb4 collate utf8mb4_bin NOT NULL,
	`context` longtext character set utf8mb4 collate utf8mb4_bin NOT NULL,
	`created_by` char(26) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `blends_team_id_id_pk` PRIMARY KEY(`team_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `limit_maxima` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`limit_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`category` varchar(8) character set ascii collate ascii_bin NOT NULL,
	`max_fraction` decimal(10,8) NOT NULL,
	CONSTRAINT `limit_maxima_team_id_limit_id_category_pk` PRIMARY KEY(`team_id`,`limit_id`,`category`),
	CONSTRAINT `limit_maxima_range` CHECK(`limit_maxima`.`max_fraction` between 0 and 1)
);
--> statement-breakpoint
CREATE TABLE `limit_sets` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`id` char(26) character set ascii collate ascii_bin NOT NULL,
	`slug` varchar(60) character set ascii collate ascii_bin NOT NULL,
	`title` varchar(200) NOT NULL,
	`edition` varchar(120) NOT NULL,
	`dated_on` date,
	`scope` varchar(400) NOT NULL,
	`source` varchar(400) NOT NULL,
	`in_force` boolean NOT NULL DEFAULT true,
	CONSTRAINT `limit_sets_team_id_id_pk` PRIMARY KEY(`team_id`,`id`),
	CONSTRAINT `limit_sets_slug` UNIQUE(`team_id`,`slug`)
);
--> statement-breakpoint
CREATE TABLE `limit_terms` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`limit_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`constituent_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`factor` decimal(12,6) NOT NULL,
	CONSTRAINT `limit_terms_team_id_limit_id_constituent_id_pk` PRIMARY KEY(`team_id`,`limit_id`,`constituent_id`),
	CONSTRAINT `limit_terms_factor` CHECK(`limit_terms`.`factor` >= 0)
);
--> statement-breakpoint
CREATE TABLE `limits` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`id` char(26) character set ascii collate ascii_bin NOT NULL,
	`set_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`slug` varchar(100) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(200) NOT NULL,
	`kind` varchar(16) character set ascii collate ascii_bin NOT NULL,
	`source` varchar(400) NOT NULL,
	`via` varchar(24) character set ascii collate ascii_bin NOT NULL,
	`note` text,
	CONSTRAINT `limits_team_id_id_pk` PRIMARY KEY(`team_id`,`id`),
	CONSTRAINT `limits_slug` UNIQUE(`team_id`,`set_id`,`slug`),
	CONSTRAINT `limits_kind` CHECK(`limits`.`kind` in ('restriction','prohibition','specification')),
	CONSTRAINT `limits_via` CHECK(`limits`.`via` in ('document text seen','secondary text seen','memory','invented','computed'))
);
--> statement-breakpoint
CREATE TABLE `product_categories` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`code` varchar(8) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(200) NOT NULL,
	`exposure` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`position` smallint NOT NULL,
	`source` varchar(300) NOT NULL,
	CONSTRAINT `product_categories_team_id_code_pk` PRIMARY KEY(`team_id`,`code`)
);
--> statement-breakpoint
CREATE TABLE `facets` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`id` char(26) character set ascii collate ascii_bin NOT NULL,
	`slug` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(60) NOT NULL,
	`family` varchar(60) NOT NULL,
	`description` varchar(400) NOT NULL,
	`position` smallint NOT NULL,
	`hue_deg` decimal(6,3) NOT NULL,
	`lightness` decimal(4,3) NOT NULL,
	CONSTRAINT `facets_team_id_id_pk` PRIMARY KEY(`team_id`,`id`),
	CONSTRAINT `facets_slug` UNIQUE(`team_id`,`slug`),
	CONSTRAINT `facets_hue` CHECK(`facets`.`hue_deg` >= 0 and `facets`.`hue_deg` < 360),
	CONSTRAINT `facets_lightness` CHECK(`facets`.`lightness` between 0 and 1)
);
--> statement-breakpoint
CREATE TABLE `material_cas` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`material_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`cas` varchar(14) character set ascii collate ascii_bin NOT NULL,
	`position` smallint NOT NULL,
	CONSTRAINT `material_cas_team_id_material_id_cas_pk` PRIMARY KEY(`team_id`,`material_id`,`cas`)
);
--> statement-breakpoint
CREATE TABLE `material_cautions` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`material_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`code` varchar(24) character set ascii collate ascii_bin NOT NULL,
	`source` varchar(300) NOT NULL,
	CONSTRAINT `material_cautions_team_id_material_id_code_pk` PRIMARY KEY(`team_id`,`material_id`,`code`)
);
--> statement-breakpoint
CREATE TABLE `material_facets` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`material_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`facet_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`phase` varchar(8) character set ascii collate ascii_bin NOT NULL,
	`intensity` decimal(4,2) NOT NULL,
	`sd` decimal(4,2) NOT NULL,
	CONSTRAINT `material_facets_team_id_material_id_facet_id_phase_pk` PRIMARY KEY(`team_id`,`material_id`,`facet_id`,`phase`),
	CONSTRAINT `material_facets_phase` CHECK(`material_facets`.`phase` in ('all','opening','heart','dry')),
	CONSTRAINT `material_facets_intensity` CHECK(`material_facets`.`intensity` between 0 and 10 and `material_facets`.`sd` between 0 and 10)
);
--> statement-breakpoint
CREATE TABLE `material_parts` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`material_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`part_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`share` decimal(10,8) NOT NULL,
	CONSTRAINT `material_parts_team_id_material_id_part_id_pk` PRIMARY KEY(`team_id`,`material_id`,`part_id`),
	CONSTRAINT `material_parts_share` CHECK(`material_parts`.`share` > 0 and `material_parts`.`share` <= 1)
);
--> statement-breakpoint
CREATE TABLE `material_synonyms` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`material_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`position` smallint NOT NULL,
	`name` varchar(160) NOT NULL,
	CONSTRAINT `material_synonyms_team_id_material_id_position_pk` PRIMARY KEY(`team_id`,`material_id`,`position`)
);
--> statement-breakpoint
CREATE TABLE `materials` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`id` char(26) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(160) NOT NULL,
	`kind` varchar(24) character set ascii collate ascii_bin NOT NULL,
	`botanical_name` varchar(160),
	`plant_part` varchar(80),
	`chemical_name` varchar(200),
	`inci_name` varchar(200),
	`smell` text NOT NULL,
	`natural_share` decimal(10,8) NOT NULL,
	`strength` double NOT NULL,
	`strength_spread` double NOT NULL,
	`strength_class` varchar(16) character set ascii collate ascii_bin NOT NULL,
	`strength_source` varchar(400) NOT NULL,
	`vapour_pressure_pa` double,
	`vapour_pressure_source` varchar(400),
	`odour_threshold_ug_per_m_3` double,
	`odour_threshold_source` varchar(400),
	`evaporation_per_hour` double,
	`evaporation_source` varchar(400),
	`usual_dilution` decimal(10,8),
	`dilution_solvent` varchar(80),
	`max_share` decimal(10,8),
	`note` text,
	`revision` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	`updated_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `materials_team_id_id_pk` PRIMARY KEY(`team_id`,`id`),
	CONSTRAINT `materials_name` UNIQUE(`team_id`,`name`),
	CONSTRAINT `materials_kind_known` CHECK(`materials`.`kind` in ('oil','absolute','resinoid','extract','synthetic','isolate','ready base','solvent')),
	CONSTRAINT `materials_natural` CHECK(`materials`.`natural_share` between 0 and 1),
	CONSTRAINT `materials_strength` CHECK(`materials`.`strength` >= 0 and `materials`.`strength_spread` >= 1),
	CONSTRAINT `materials_strength_class` CHECK(`materials`.`strength_class` in ('odourless','faint','weak','medium','strong','very strong','mighty')),
	CONSTRAINT `materials_measured` CHECK(`materials`.`vapour_pressure_pa` > 0 and `materials`.`odour_threshold_ug_per_m_3` > 0),
	CONSTRAINT `materials_evaporation` CHECK(`materials`.`evaporation_per_hour` >= 0),
	CONSTRAINT `materials_dilution` CHECK(`materials`.`usual_dilution` between 0 and 1),
	CONSTRAINT `materials_max_share` CHECK(`materials`.`max_share` between 0 and 1)
);
--> statement-breakpoint
CREATE TABLE `attempts` (
	`key` binary(32) NOT NULL,
	`window_start` datetime(3) NOT NULL,
	`count` int NOT NULL,
	CONSTRAINT `attempts_key_window_start_pk` PRIMARY KEY(`key`,`window_start`)
);
--> statement-breakpoint
CREATE TABLE `membership_roles` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`user_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`role` varchar(16) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `membership_roles_team_id_user_id_role_pk` PRIMARY KEY(`team_id`,`user_id`,`role`),
	CONSTRAINT `membership_roles_role` CHECK(`membership_roles`.`role` in ('owner','perfumer','evaluator','buyer','safety','student'))
);
--> statement-breakpoint
CREATE TABLE `memberships` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`user_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `memberships_team_id_user_id_pk` PRIMARY KEY(`team_id`,`user_id`)
);
--> statement-breakpoint
CREATE TABLE `sessions` (
	`id` binary(32) NOT NULL,
	`user_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`ends_at` datetime(3) NOT NULL,
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `sessions_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `teams` (
	`id` char(26) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`currency` char(3) NOT NULL,
	`is_demo` boolean NOT NULL DEFAULT false,
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `teams_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `users` (
	`id` char(26) character set ascii collate ascii_bin NOT NULL,
	`email` varchar(254) character set utf8mb4 collate utf8mb4_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`password_hash` varchar(200) NOT NULL,
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `users_id` PRIMARY KEY(`id`),
	CONSTRAINT `users_email` UNIQUE(`email`)
);
--> statement-breakpoint
CREATE TABLE `constituents` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`id` char(26) character set ascii collate ascii_bin NOT NULL,
	`slug` varchar(80) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(160) NOT NULL,
	`cas` varchar(14) character set ascii collate ascii_bin,
	CONSTRAINT `constituents_team_id_id_pk` PRIMARY KEY(`team_id`,`id`),
	CONSTRAINT `constituents_slug` UNIQUE(`team_id`,`slug`)
);
--> statement-breakpoint
CREATE TABLE `offers` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`id` char(26) character set ascii collate ascii_bin NOT NULL,
	`quality_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`pack_amount` decimal(14,6) NOT NULL,
	`pack_unit` varchar(4) character set ascii collate ascii_bin NOT NULL,
	`price` decimal(14,4) NOT NULL,
	`currency` char(3) NOT NULL,
	`offered_on` date NOT NULL,
	CONSTRAINT `offers_team_id_id_pk` PRIMARY KEY(`team_id`,`id`),
	CONSTRAINT `offers_pack` CHECK(`offers`.`pack_amount` > 0 and `offers`.`pack_unit` in ('g','mL')),
	CONSTRAINT `offers_price` CHECK(`offers`.`price` > 0)
);
--> statement-breakpoint
CREATE TABLE `qualities` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`id` char(26) character set ascii collate ascii_bin NOT NULL,
	`material_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`supplier_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`position` smallint NOT NULL DEFAULT 0,
	`code` varchar(60) NOT NULL,
	`grade` varchar(120) NOT NULL,
	`origin` varchar(120),
	`completeness` varchar(10) character set ascii collate ascii_bin NOT NULL,
	`composition_source` varchar(400) NOT NULL,
	`density_g_per_ml` decimal(6,4),
	`form` varchar(16) character set ascii collate ascii_bin NOT NULL,
	`warm_to_c` decimal(5,1),
	`flash_point_c` decimal(5,1),
	`colour` varchar(80),
	`revision` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `qualities_team_id_id_pk` PRIMARY KEY(`team_id`,`id`),
	CONSTRAINT `qualities_code` UNIQUE(`team_id`,`supplier_id`,`code`,`grade`),
	CONSTRAINT `qualities_completeness` CHECK(`qualities`.`completeness` in ('full','declared','unknown')),
	CONSTRAINT `qualities_form` CHECK(`qualities`.`form` in ('mobile liquid','viscous liquid','paste','crystals','solid')),
	CONSTRAINT `qualities_density` CHECK(`qualities`.`density_g_per_ml` > 0)
);
--> statement-breakpoint
CREATE TABLE `quality_constituents` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`quality_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`constituent_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`min_fraction` decimal(10,8) NOT NULL,
	`typical_fraction` decimal(10,8),
	`max_fraction` decimal(10,8) NOT NULL,
	`source` varchar(300) NOT NULL,
	CONSTRAINT `quality_constituents_team_id_quality_id_constituent_id_pk` PRIMARY KEY(`team_id`,`quality_id`,`constituent_id`),
	CONSTRAINT `quality_constituents_range` CHECK(0 <= `quality_constituents`.`min_fraction` and `quality_constituents`.`min_fraction` <= `quality_constituents`.`max_fraction` and `quality_constituents`.`max_fraction` <= 1),
	CONSTRAINT `quality_constituents_typical` CHECK(`quality_constituents`.`typical_fraction` between `quality_constituents`.`min_fraction` and `quality_constituents`.`max_fraction`)
);
--> statement-breakpoint
CREATE TABLE `suppliers` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`id` char(26) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`note` varchar(400),
	CONSTRAINT `suppliers_team_id_id_pk` PRIMARY KEY(`team_id`,`id`),
	CONSTRAINT `suppliers_name` UNIQUE(`team_id`,`name`)
);
--> statement-breakpoint
CREATE TABLE `activity` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`id` char(26) character set ascii collate ascii_bin NOT NULL,
	`user_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`action` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`subject_id` char(26) character set ascii collate ascii_bin,
	`detail` longtext character set utf8mb4 collate utf8mb4_bin NOT NULL,
	`at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `activity_team_id_id_pk` PRIMARY KEY(`team_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `idempotency_keys` (
	`team_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`user_id` char(26) character set ascii collate ascii_bin NOT NULL,
	`operation` varchar(60) character set ascii collate ascii_bin NOT NULL,
	`key` varchar(128) character set utf8mb4 collate utf8mb4_bin NOT NULL,
	`body_hash` binary(32) NOT NULL,
	`status` smallint,
	`answer` longtext character set utf8mb4 collate utf8mb4_bin,
	`created_at` datetime(3) NOT NULL DEFAULT (utc_timestamp(3)),
	CONSTRAINT `idempotency_keys_team_id_user_id_operation_key_pk` PRIMARY KEY(`team_id`,`user_id`,`operation`,`key`)
);
--> statement-breakpoint
ALTER TABLE `blend_lines` ADD CONSTRAINT `blend_lines_blend` FOREIGN KEY (`team_id`,`blend_id`) REFERENCES `blends`(`team_id`,`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `blends` ADD CONSTRAINT `blends_team_id_teams_id_fk` FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `blends` ADD CONSTRAINT `blends_created_by_users_id_fk` FOREIGN KEY (`created_by`) REFERENCES `users`(`id`) ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `limit_maxima` ADD CONSTRAINT `limit_maxima_limit` FOREIGN KEY (`team_id`,`limit_id`) REFERENCES `limits`(`team_id`,`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `limit_maxima` ADD CONSTRAINT `limit_maxima_category` FOREIGN KEY (`team_id`,`category`) REFERENCES `product_categories`(`team_id`,`code`) ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `limit_sets` ADD CONSTRAINT `limit_sets_team_id_teams_id_fk` FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `limit_terms` ADD CONSTRAINT `limit_terms_limit` FOREIGN KEY (`team_id`,`limit_id`) REFERENCES `limits`(`team_id`,`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `limit_terms` ADD CONSTRAINT `limit_terms_constituent` FOREIGN KEY (`team_id`,`constituent_id`) REFERENCES `constituents`(`team_id`,`id`) ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `limits` ADD CONSTRAINT `limits_set` FOREIGN KEY (`team_id`,`set_id`) REFERENCES `limit_sets`(`team_id`,`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `product_categories` ADD CONSTRAINT `product_categories_team_id_teams_id_fk` FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `facets` ADD CONSTRAINT `facets_team_id_teams_id_fk` FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `material_cas` ADD CONSTRAINT `material_cas_material` FOREIGN KEY (`team_id`,`material_id`) REFERENCES `materials`(`team_id`,`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `material_cautions` ADD CONSTRAINT `material_cautions_material` FOREIGN KEY (`team_id`,`material_id`) REFERENCES `materials`(`team_id`,`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `material_facets` ADD CONSTRAINT `material_facets_material` FOREIGN KEY (`team_id`,`material_id`) REFERENCES `materials`(`team_id`,`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `material_facets` ADD CONSTRAINT `material_facets_facet_word` FOREIGN KEY (`team_id`,`facet_id`) REFERENCES `facets`(`team_id`,`id`) ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `material_parts` ADD CONSTRAINT `material_parts_material` FOREIGN KEY (`team_id`,`material_id`) REFERENCES `materials`(`team_id`,`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `material_parts` ADD CONSTRAINT `material_parts_part` FOREIGN KEY (`team_id`,`part_id`) REFERENCES `materials`(`team_id`,`id`) ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `material_synonyms` ADD CONSTRAINT `material_synonyms_material` FOREIGN KEY (`team_id`,`material_id`) REFERENCES `materials`(`team_id`,`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `materials` ADD CONSTRAINT `materials_team_id_teams_id_fk` FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `membership_roles` ADD CONSTRAINT `membership_roles_member` FOREIGN KEY (`team_id`,`user_id`) REFERENCES `memberships`(`team_id`,`user_id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `memberships` ADD CONSTRAINT `memberships_team_id_teams_id_fk` FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `memberships` ADD CONSTRAINT `memberships_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sessions` ADD CONSTRAINT `sessions_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `constituents` ADD CONSTRAINT `constituents_team_id_teams_id_fk` FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `offers` ADD CONSTRAINT `offers_quality_row` FOREIGN KEY (`team_id`,`quality_id`) REFERENCES `qualities`(`team_id`,`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `qualities` ADD CONSTRAINT `qualities_team_id_teams_id_fk` FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `qualities` ADD CONSTRAINT `qualities_material_row` FOREIGN KEY (`team_id`,`material_id`) REFERENCES `materials`(`team_id`,`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `qualities` ADD CONSTRAINT `qualities_supplier_row` FOREIGN KEY (`team_id`,`supplier_id`) REFERENCES `suppliers`(`team_id`,`id`) ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `quality_constituents` ADD CONSTRAINT `quality_constituents_quality` FOREIGN KEY (`team_id`,`quality_id`) REFERENCES `qualities`(`team_id`,`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `quality_constituents` ADD CONSTRAINT `quality_constituents_word` FOREIGN KEY (`team_id`,`constituent_id`) REFERENCES `constituents`(`team_id`,`id`) ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `suppliers` ADD CONSTRAINT `suppliers_team_id_teams_id_fk` FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `activity` ADD CONSTRAINT `activity_team_id_teams_id_fk` FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `idempotency_keys` ADD CONSTRAINT `idempotency_keys_member` FOREIGN KEY (`team_id`,`user_id`) REFERENCES `memberships`(`team_id`,`user_id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `blend_lines_material` ON `blend_lines` (`team_id`,`material_id`);--> statement-breakpoint
CREATE INDEX `blends_newest` ON `blends` (`team_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `material_cas_number` ON `material_cas` (`team_id`,`cas`);--> statement-breakpoint
CREATE INDEX `material_facets_facet` ON `material_facets` (`team_id`,`facet_id`);--> statement-breakpoint
CREATE INDEX `materials_kind` ON `materials` (`team_id`,`kind`);--> statement-breakpoint
CREATE INDEX `attempts_window` ON `attempts` (`window_start`);--> statement-breakpoint
CREATE INDEX `memberships_user` ON `memberships` (`user_id`);--> statement-breakpoint
CREATE INDEX `sessions_user` ON `sessions` (`user_id`);--> statement-breakpoint
CREATE INDEX `sessions_expiry` ON `sessions` (`expires_at`);--> statement-breakpoint
CREATE INDEX `constituents_cas` ON `constituents` (`team_id`,`cas`);--> statement-breakpoint
CREATE INDEX `offers_quality` ON `offers` (`team_id`,`quality_id`);--> statement-breakpoint
CREATE INDEX `qualities_material` ON `qualities` (`team_id`,`material_id`,`position`);--> statement-breakpoint
CREATE INDEX `quality_constituents_of` ON `quality_constituents` (`team_id`,`constituent_id`);--> statement-breakpoint
CREATE INDEX `activity_subject` ON `activity` (`team_id`,`subject_id`);--> statement-breakpoint
CREATE INDEX `idempotency_keys_age` ON `idempotency_keys` (`created_at`);