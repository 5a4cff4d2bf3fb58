CREATE TABLE `anchor_points` (
	`anchor_id` uuid NOT NULL,
	`pos` point NOT NULL,
	`accuracy_m` double NOT NULL,
	`method` varchar(40) NOT NULL,
	CONSTRAINT `anchor_points_anchor_id` PRIMARY KEY(`anchor_id`)
);
--> statement-breakpoint
CREATE TABLE `anchors` (
	`id` uuid NOT NULL,
	`map_no` int AUTO_INCREMENT NOT NULL,
	`code` varchar(7) NOT NULL,
	`crag_id` uuid NOT NULL,
	`kind` varchar(20) NOT NULL,
	`life` varchar(12) NOT NULL,
	`replaced_by` uuid,
	`state` varchar(10) NOT NULL,
	`state_on` date,
	`state_how` varchar(20),
	`lapses_on` date,
	`worst_band` varchar(10),
	`worst_rate` double,
	`open_hazards` int NOT NULL DEFAULT 0,
	`notices` int NOT NULL DEFAULT 0,
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `anchors_id` PRIMARY KEY(`id`),
	CONSTRAINT `anchors_map_no_unique` UNIQUE(`map_no`),
	CONSTRAINT `anchors_code_unique` UNIQUE(`code`),
	CONSTRAINT `anchors_kind` CHECK(`kind` in ('bolt', 'lower_off', 'stance', 'abseil_station', 'thread', 'peg', 'belay_stake')),
	CONSTRAINT `anchors_life` CHECK(`life` in ('in_place', 'out_of_use', 'removed', 'replaced')),
	CONSTRAINT `anchors_state` CHECK(`state` in ('severe', 'poor', 'fair', 'unknown', 'good'))
);
--> statement-breakpoint
CREATE TABLE `areas` (
	`id` uuid NOT NULL,
	`parent_id` uuid,
	`code` varchar(2) NOT NULL,
	`name` varchar(120) NOT NULL,
	`time_zone` varchar(60) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `areas_id` PRIMARY KEY(`id`),
	CONSTRAINT `areas_code_unique` UNIQUE(`code`)
);
--> statement-breakpoint
CREATE TABLE `climb_anchors` (
	`climb_id` uuid NOT NULL,
	`anchor_id` uuid NOT NULL,
	`pitch_id` uuid NOT NULL,
	`ordinal` int NOT NULL,
	`along_m` double NOT NULL,
	`assumed` boolean NOT NULL,
	`below` varchar(10) NOT NULL,
	`from_on` date NOT NULL,
	`to_on` date,
	CONSTRAINT `climb_anchors_climb_id_anchor_id_from_on_pk` PRIMARY KEY(`climb_id`,`anchor_id`,`from_on`),
	CONSTRAINT `climb_anchors_below` CHECK(`below` in ('ground', 'ledge', 'stance', 'sea', 'air'))
);
--> statement-breakpoint
CREATE TABLE `climbs` (
	`id` uuid NOT NULL,
	`map_no` int AUTO_INCREMENT NOT NULL,
	`sector_id` uuid NOT NULL,
	`code` varchar(7) NOT NULL,
	`name` varchar(120) NOT NULL,
	`grade` varchar(20),
	`ordinal` int NOT NULL,
	`foot` point NOT NULL,
	`traffic` varchar(10) NOT NULL,
	`ascents_year` int,
	`retired_at` datetime(3),
	`worst_state` varchar(10) NOT NULL,
	`worst_band` varchar(10),
	`open_hazards` int NOT NULL DEFAULT 0,
	`notices` int NOT NULL DEFAULT 0,
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `climbs_id` PRIMARY KEY(`id`),
	CONSTRAINT `climbs_map_no_unique` UNIQUE(`map_no`),
	CONSTRAINT `climbs_code_unique` UNIQUE(`code`),
	CONSTRAINT `climbs_traffic` CHECK(`traffic` in ('quiet', 'steady', 'busy', 'groups')),
	CONSTRAINT `climbs_state` CHECK(`worst_state` in ('severe', 'poor', 'fair', 'unknown', 'good'))
);
--> statement-breakpoint
CREATE TABLE `consents` (
	`id` uuid NOT NULL,
	`crag_id` uuid NOT NULL,
	`state` varchar(12) NOT NULL,
	`owner` varchar(200),
	`given_by` varchar(200),
	`until_on` date,
	`conditions` text,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `consents_id` PRIMARY KEY(`id`),
	CONSTRAINT `consents_state` CHECK(`state` in ('given', 'not_needed', 'disputed', 'unknown'))
);
--> statement-breakpoint
CREATE TABLE `crag_keepers` (
	`crag_id` uuid NOT NULL,
	`person_id` uuid NOT NULL,
	`rank` int NOT NULL,
	`away_from` date,
	`away_to` date,
	CONSTRAINT `crag_keepers_crag_id_person_id_pk` PRIMARY KEY(`crag_id`,`person_id`)
);
--> statement-breakpoint
CREATE TABLE `crag_organisations` (
	`crag_id` uuid NOT NULL,
	`organisation_id` uuid NOT NULL,
	`remit` varchar(10) NOT NULL,
	`lead` boolean NOT NULL,
	CONSTRAINT `crag_organisations_crag_id_organisation_id_remit_pk` PRIMARY KEY(`crag_id`,`organisation_id`,`remit`),
	CONSTRAINT `crag_organisations_remit` CHECK(`remit` in ('rebolting', 'access'))
);
--> statement-breakpoint
CREATE TABLE `crags` (
	`id` uuid NOT NULL,
	`map_no` int AUTO_INCREMENT NOT NULL,
	`area_id` uuid NOT NULL,
	`code` varchar(7) NOT NULL,
	`name` varchar(120) NOT NULL,
	`pos` point NOT NULL,
	`sensitive` varchar(10) NOT NULL,
	`hazard_detail` varchar(10) NOT NULL,
	`rock` varchar(20) NOT NULL,
	`sea_km` double,
	`warm_sea` boolean NOT NULL,
	`corrosivity` varchar(2),
	`aspect` varchar(20),
	`consent` varchar(12) NOT NULL,
	`policy` text,
	`approach` text,
	`worst_state` varchar(10) NOT NULL,
	`worst_band` varchar(10),
	`open_hazards` int NOT NULL DEFAULT 0,
	`notices` int NOT NULL DEFAULT 0,
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `crags_id` PRIMARY KEY(`id`),
	CONSTRAINT `crags_map_no_unique` UNIQUE(`map_no`),
	CONSTRAINT `crags_code_unique` UNIQUE(`code`),
	CONSTRAINT `crags_sensitive` CHECK(`sensitive` in ('open', 'withheld', 'members')),
	CONSTRAINT `crags_hazard_detail` CHECK(`hazard_detail` in ('full', 'crag', 'members')),
	CONSTRAINT `crags_consent` CHECK(`consent` in ('given', 'not_needed', 'disputed', 'unknown')),
	CONSTRAINT `crags_state` CHECK(`worst_state` in ('severe', 'poor', 'fair', 'unknown', 'good'))
);
--> statement-breakpoint
CREATE TABLE `ledges` (
	`pitch_id` uuid NOT NULL,
	`at_m` double NOT NULL,
	`below` varchar(10) NOT NULL,
	CONSTRAINT `ledges_pitch_id_at_m_pk` PRIMARY KEY(`pitch_id`,`at_m`),
	CONSTRAINT `ledges_below` CHECK(`below` in ('ground', 'ledge', 'stance', 'sea', 'air'))
);
--> statement-breakpoint
CREATE TABLE `makers` (
	`id` uuid NOT NULL,
	`name` varchar(120) NOT NULL,
	CONSTRAINT `makers_id` PRIMARY KEY(`id`),
	CONSTRAINT `makers_name_unique` UNIQUE(`name`)
);
--> statement-breakpoint
CREATE TABLE `parts` (
	`id` uuid NOT NULL,
	`anchor_id` uuid NOT NULL,
	`side` varchar(1),
	`kind` varchar(20) NOT NULL,
	`material` varchar(20) NOT NULL,
	`size_mm` double,
	`length_mm` double,
	`marking` varchar(120),
	`standard` varchar(60),
	`maker_id` uuid,
	`model` varchar(120),
	`batch` varchar(60),
	`fitted_on` date,
	`fitted_precision` varchar(10) NOT NULL,
	`removed_on` date,
	`fitted_by_record` uuid,
	`removed_by_record` uuid,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `parts_id` PRIMARY KEY(`id`),
	CONSTRAINT `parts_kind` CHECK(`kind` in ('wedge_bolt', 'sleeve_bolt', 'self_drilled', 'drive_in', 'screw_in', 'bonded_eye', 'bonded_staple', 'bonded_stud', 'hanger', 'ring', 'lower_off_hook', 'cold_shut', 'swivel', 'chain', 'quick_link', 'fixed_draw', 'connector', 'sling', 'cord', 'cable', 'resin', 'peg', 'thread')),
	CONSTRAINT `parts_material` CHECK(`material` in ('plated_steel', 'stainless', 'stainless_resistant', 'titanium', 'steel', 'aluminium', 'fabric', 'unknown')),
	CONSTRAINT `parts_precision` CHECK(`fitted_precision` in ('day', 'month', 'year', 'unknown'))
);
--> statement-breakpoint
CREATE TABLE `pitches` (
	`id` uuid NOT NULL,
	`climb_id` uuid NOT NULL,
	`number` int NOT NULL,
	`length_m` double NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `pitches_id` PRIMARY KEY(`id`),
	CONSTRAINT `pitches_number` UNIQUE(`climb_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `place_names` (
	`id` uuid NOT NULL,
	`area_id` uuid,
	`crag_id` uuid,
	`sector_id` uuid,
	`climb_id` uuid,
	`name` varchar(120) NOT NULL,
	`lang` varchar(12),
	`from_on` date,
	`to_on` date,
	`hidden` boolean NOT NULL DEFAULT false,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `place_names_id` PRIMARY KEY(`id`),
	CONSTRAINT `place_names_of` CHECK((`area_id` is not null) + (`crag_id` is not null) + (`sector_id` is not null) + (`climb_id` is not null) = 1)
);
--> statement-breakpoint
CREATE TABLE `sectors` (
	`id` uuid NOT NULL,
	`crag_id` uuid NOT NULL,
	`name` varchar(120) NOT NULL,
	`ordinal` int NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `sectors_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `messages` (
	`id` uuid NOT NULL,
	`dedupe_key` varchar(160) NOT NULL,
	`message_id` varchar(200) NOT NULL,
	`kind` varchar(40) NOT NULL,
	`to_email` varchar(254) NOT NULL,
	`person_id` uuid,
	`thread` varchar(200),
	`subject` varchar(300) NOT NULL,
	`text` text,
	`html` text,
	`parts` json NOT NULL,
	`state` varchar(10) NOT NULL,
	`due_at` datetime(3) NOT NULL,
	`tries` int NOT NULL DEFAULT 0,
	`lease_by` varchar(40),
	`lease_until` datetime(3),
	`error` text,
	`sent_at` datetime(3),
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `messages_id` PRIMARY KEY(`id`),
	CONSTRAINT `messages_dedupe_key_unique` UNIQUE(`dedupe_key`),
	CONSTRAINT `messages_message_id_unique` UNIQUE(`message_id`),
	CONSTRAINT `messages_state` CHECK(`state` in ('waiting', 'done', 'dead'))
);
--> statement-breakpoint
CREATE TABLE `notice_hazards` (
	`notice_id` uuid NOT NULL,
	`hazard_id` uuid NOT NULL,
	CONSTRAINT `notice_hazards_notice_id_hazard_id_pk` PRIMARY KEY(`notice_id`,`hazard_id`)
);
--> statement-breakpoint
CREATE TABLE `notice_places` (
	`id` uuid NOT NULL,
	`notice_id` uuid NOT NULL,
	`area_id` uuid,
	`crag_id` uuid,
	`sector_id` uuid,
	`climb_id` uuid,
	`anchor_id` uuid,
	CONSTRAINT `notice_places_id` PRIMARY KEY(`id`),
	CONSTRAINT `notice_places_of` CHECK((`area_id` is not null) + (`crag_id` is not null) + (`sector_id` is not null) + (`climb_id` is not null) + (`anchor_id` is not null) = 1)
);
--> statement-breakpoint
CREATE TABLE `notice_revisions` (
	`notice_id` uuid NOT NULL,
	`number` int NOT NULL,
	`headline` varchar(200) NOT NULL,
	`words` text NOT NULL,
	`lang` varchar(12) NOT NULL,
	`starts_at` datetime(3) NOT NULL,
	`ends_at` datetime(3),
	`while_open` boolean NOT NULL,
	`by_person_id` uuid,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `notice_revisions_notice_id_number_pk` PRIMARY KEY(`notice_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `notices` (
	`id` uuid NOT NULL,
	`code` varchar(7) NOT NULL,
	`organisation_id` uuid NOT NULL,
	`kind` varchar(20) NOT NULL,
	`state` varchar(10) NOT NULL,
	`revision` int NOT NULL DEFAULT 1,
	`decided_by_words` varchar(200),
	`ground` varchar(300),
	`review_on` date,
	`published_by` uuid,
	`confirmed_by` uuid,
	`confirmed_at` datetime(3),
	`published_at` datetime(3),
	`withdrawn_at` datetime(3),
	`withdrawn_by` uuid,
	`asked_at` datetime(3),
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `notices_id` PRIMARY KEY(`id`),
	CONSTRAINT `notices_code_unique` UNIQUE(`code`),
	CONSTRAINT `notices_kind` CHECK(`kind` in ('first_warning', 'hazard', 'works', 'please_do_not_climb', 'owner_forbids', 'closed_in_law')),
	CONSTRAINT `notices_state_word` CHECK(`state` in ('draft', 'published', 'withdrawn'))
);
--> statement-breakpoint
CREATE TABLE `membership_roles` (
	`membership_id` uuid NOT NULL,
	`role` varchar(20) NOT NULL,
	CONSTRAINT `membership_roles_membership_id_role_pk` PRIMARY KEY(`membership_id`,`role`),
	CONSTRAINT `role` CHECK(`role` in ('rebolter', 'coordinator', 'access_officer', 'admin'))
);
--> statement-breakpoint
CREATE TABLE `memberships` (
	`id` uuid NOT NULL,
	`organisation_id` uuid NOT NULL,
	`person_id` uuid NOT NULL,
	`ended_at` datetime(3),
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `memberships_id` PRIMARY KEY(`id`),
	CONSTRAINT `memberships_once` UNIQUE(`organisation_id`,`person_id`)
);
--> statement-breakpoint
CREATE TABLE `organisations` (
	`id` uuid NOT NULL,
	`name` varchar(120) NOT NULL,
	`time_zone` varchar(60) NOT NULL,
	`currency` varchar(3) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `organisations_id` PRIMARY KEY(`id`),
	CONSTRAINT `organisations_name_unique` UNIQUE(`name`)
);
--> statement-breakpoint
CREATE TABLE `people` (
	`id` uuid NOT NULL,
	`name` varchar(120) NOT NULL,
	`email` varchar(254),
	`email_confirmed_at` datetime(3),
	`over_18` boolean NOT NULL DEFAULT false,
	`erased_at` datetime(3),
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `people_id` PRIMARY KEY(`id`),
	CONSTRAINT `people_email` UNIQUE(`email`)
);
--> statement-breakpoint
CREATE TABLE `sessions` (
	`token_hash` varchar(64) NOT NULL,
	`person_id` uuid NOT NULL,
	`seen_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`confirmed_at` datetime(3) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `sessions_token_hash` PRIMARY KEY(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `sign_in_codes` (
	`id` uuid NOT NULL,
	`email` varchar(254) NOT NULL,
	`network` varchar(64) NOT NULL,
	`browser_hash` varchar(64) NOT NULL,
	`code_hash` varchar(64) NOT NULL,
	`tries` int NOT NULL DEFAULT 0,
	`expires_at` datetime(3) NOT NULL,
	`used_at` datetime(3),
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `sign_in_codes_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `rating_models` (
	`id` uuid NOT NULL,
	`number` int NOT NULL,
	`adopted_at` datetime(3) NOT NULL,
	CONSTRAINT `rating_models_id` PRIMARY KEY(`id`),
	CONSTRAINT `rating_models_number_unique` UNIQUE(`number`)
);
--> statement-breakpoint
CREATE TABLE `rating_values` (
	`model_id` uuid NOT NULL,
	`name` varchar(120) NOT NULL,
	`low` double NOT NULL,
	`central` double NOT NULL,
	`high` double NOT NULL,
	`unit` varchar(80) NOT NULL,
	`source` text NOT NULL,
	`mark` varchar(10) NOT NULL,
	CONSTRAINT `rating_values_model_id_name_pk` PRIMARY KEY(`model_id`,`name`)
);
--> statement-breakpoint
CREATE TABLE `ratings` (
	`id` uuid NOT NULL,
	`report_id` uuid,
	`hazard_id` uuid,
	`model_id` uuid NOT NULL,
	`engine` varchar(20) NOT NULL,
	`inputs` json NOT NULL,
	`inputs_hash` varchar(64) NOT NULL,
	`results` json NOT NULL,
	`band_low` varchar(10) NOT NULL,
	`band` varchar(10) NOT NULL,
	`band_high` varchar(10) NOT NULL,
	`cause` varchar(60) NOT NULL,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `ratings_id` PRIMARY KEY(`id`),
	CONSTRAINT `ratings_band` CHECK(`band` in ('first', 'soon', 'turn', 'watch')),
	CONSTRAINT `ratings_of` CHECK((`report_id` is not null) + (`hazard_id` is not null) = 1)
);
--> statement-breakpoint
CREATE TABLE `activities` (
	`id` uuid NOT NULL,
	`at` datetime(3) NOT NULL,
	`organisation_id` uuid,
	`crag_id` uuid,
	`by_person_id` uuid,
	`by_kind` varchar(10) NOT NULL,
	`verb` varchar(40) NOT NULL,
	`subject_kind` varchar(20) NOT NULL,
	`subject_id` uuid NOT NULL,
	`public` boolean NOT NULL,
	`details` json,
	CONSTRAINT `activities_id` PRIMARY KEY(`id`),
	CONSTRAINT `activities_by` CHECK(`by_kind` in ('person', 'guest', 'link', 'system')),
	CONSTRAINT `activities_of` CHECK(`subject_kind` in ('person', 'organisation', 'crag', 'climb', 'anchor', 'part', 'report', 'hazard', 'notice', 'order', 'offer', 'work_record', 'photo'))
);
--> statement-breakpoint
CREATE TABLE `jobs` (
	`id` uuid NOT NULL,
	`dedupe_key` varchar(120) NOT NULL,
	`kind` varchar(40) NOT NULL,
	`params` json NOT NULL,
	`state` varchar(10) NOT NULL,
	`due_at` datetime(3) NOT NULL,
	`tries` int NOT NULL DEFAULT 0,
	`lease_by` varchar(40),
	`lease_until` datetime(3),
	`error` text,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `jobs_id` PRIMARY KEY(`id`),
	CONSTRAINT `jobs_dedupe_key_unique` UNIQUE(`dedupe_key`),
	CONSTRAINT `jobs_state` CHECK(`state` in ('waiting', 'done', 'dead'))
);
--> statement-breakpoint
CREATE TABLE `rate_limits` (
	`key` varchar(255) NOT NULL,
	`points` int NOT NULL DEFAULT 0,
	`expire` bigint unsigned,
	CONSTRAINT `rate_limits_key` PRIMARY KEY(`key`)
);
--> statement-breakpoint
CREATE TABLE `findings` (
	`id` uuid NOT NULL,
	`report_id` uuid NOT NULL,
	`part_id` uuid,
	`kind` varchar(30) NOT NULL,
	`unit` varchar(10),
	`low` double,
	`high` double,
	`method` varchar(20),
	`edge` varchar(10),
	`tried_by_hand` boolean,
	`words` text,
	`cleared_at` datetime(3),
	`cleared_by_record` uuid,
	`cleared_by_report` uuid,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `findings_id` PRIMARY KEY(`id`),
	CONSTRAINT `findings_kind` CHECK(`kind` in ('no_fault', 'sharp_edge_rope', 'sharp_edge_hanger', 'groove', 'section_lost', 'nut_loose', 'nut_missing', 'link_unscrewed', 'spins', 'turns_by_hand', 'loose_in_hole', 'bent', 'cracked', 'rust', 'pitting', 'mixed_metals', 'aluminium_left', 'resin_soft', 'resin_cracked', 'resin_gap', 'rock_hollow', 'rock_cracked', 'rock_spalled', 'rock_edge', 'gate_stuck', 'cross_loaded', 'nose_hooked', 'nicked', 'fabric_faded', 'fabric_stiff', 'undersized', 'home_made', 'single_point', 'badly_placed', 'rope_over_edge', 'missing', 'unknown_age', 'keeper_gone', 'hook_worn', 'known_failures', 'other'))
);
--> statement-breakpoint
CREATE TABLE `hazards` (
	`id` uuid NOT NULL,
	`code` varchar(7) NOT NULL,
	`crag_id` uuid NOT NULL,
	`anchor_id` uuid,
	`climb_id` uuid,
	`sector_id` uuid,
	`part_id` uuid,
	`mode` varchar(20) NOT NULL,
	`headline` varchar(200) NOT NULL,
	`state` varchar(20) NOT NULL,
	`warned_until` datetime(3),
	`opened_at` datetime(3) NOT NULL,
	`mended_at` datetime(3),
	`cleared_at` datetime(3),
	`joined_to` uuid,
	`rating_id` uuid,
	`band` varchar(10),
	`band_high` varchar(10),
	`urgency_sort` double NOT NULL DEFAULT 0,
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `hazards_id` PRIMARY KEY(`id`),
	CONSTRAINT `hazards_code_unique` UNIQUE(`code`),
	CONSTRAINT `hazards_state` CHECK(`state` in ('open', 'warned', 'mended', 'cleared', 'joined', 'not_confirmed', 'retired')),
	CONSTRAINT `hazards_mode` CHECK(`mode` in ('pulls_out', 'breaks', 'cuts_rope', 'releases_rope'))
);
--> statement-breakpoint
CREATE TABLE `photos` (
	`id` uuid NOT NULL,
	`storage_key` varchar(64) NOT NULL,
	`state` varchar(10) NOT NULL,
	`report_id` uuid,
	`work_record_id` uuid,
	`staged_by` varchar(64),
	`width` int NOT NULL,
	`height` int NOT NULL,
	`sha256` varchar(64) NOT NULL,
	`phash` bigint unsigned,
	`taken_at` datetime(3),
	`credit` varchar(120),
	`public` boolean NOT NULL DEFAULT false,
	`expires_at` datetime(3),
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `photos_id` PRIMARY KEY(`id`),
	CONSTRAINT `photos_storage_key_unique` UNIQUE(`storage_key`),
	CONSTRAINT `photos_state` CHECK(`state` in ('staged', 'kept', 'removed'))
);
--> statement-breakpoint
CREATE TABLE `report_anchors` (
	`report_id` uuid NOT NULL,
	`anchor_id` uuid NOT NULL,
	CONSTRAINT `report_anchors_report_id_anchor_id_pk` PRIMARY KEY(`report_id`,`anchor_id`)
);
--> statement-breakpoint
CREATE TABLE `reports` (
	`id` uuid NOT NULL,
	`client_key` varchar(64) NOT NULL,
	`crag_id` uuid NOT NULL,
	`climb_id` uuid,
	`anchor_id` uuid,
	`accuracy_m` double,
	`place_words` varchar(300),
	`seen_on` date NOT NULL,
	`recorded_at` datetime(3) NOT NULL,
	`received_at` datetime(3) NOT NULL,
	`how_seen` varchar(20) NOT NULL,
	`person_id` uuid,
	`guest_email` varchar(254),
	`confirmed_at` datetime(3),
	`is_check` boolean NOT NULL DEFAULT false,
	`words` text,
	`lang` varchar(12),
	`state` varchar(20) NOT NULL,
	`reason` text,
	`hazard_id` uuid,
	`decided_by` uuid,
	`decided_at` datetime(3),
	`rating_id` uuid,
	`band` varchar(10),
	`band_high` varchar(10),
	`urgency_sort` double NOT NULL DEFAULT 0,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `reports_id` PRIMARY KEY(`id`),
	CONSTRAINT `reports_client_key_unique` UNIQUE(`client_key`),
	CONSTRAINT `reports_state` CHECK(`state` in ('received', 'needs_detail', 'taken_in', 'on_record', 'declined', 'withdrawn')),
	CONSTRAINT `reports_how` CHECK(`how_seen` in ('on_it', 'on_the_rope', 'from_the_ground', 'told', 'photo'))
);
--> statement-breakpoint
CREATE TABLE `link_tokens` (
	`token_hash` varchar(64) NOT NULL,
	`purpose` varchar(20) NOT NULL,
	`report_id` uuid,
	`offer_id` uuid,
	`order_id` uuid,
	`expires_at` datetime(3),
	`used_at` datetime(3),
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `link_tokens_token_hash` PRIMARY KEY(`token_hash`),
	CONSTRAINT `link_tokens_of` CHECK((`report_id` is not null) + (`offer_id` is not null) + (`order_id` is not null) = 1)
);
--> statement-breakpoint
CREATE TABLE `offers` (
	`id` uuid NOT NULL,
	`order_id` uuid NOT NULL,
	`person_id` uuid NOT NULL,
	`state` varchar(10) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`answered_at` datetime(3),
	`words` text,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `offers_id` PRIMARY KEY(`id`),
	CONSTRAINT `offers_state` CHECK(`state` in ('sent', 'accepted', 'declined', 'expired', 'withdrawn'))
);
--> statement-breakpoint
CREATE TABLE `order_hazards` (
	`order_id` uuid NOT NULL,
	`hazard_id` uuid NOT NULL,
	CONSTRAINT `order_hazards_order_id_hazard_id_pk` PRIMARY KEY(`order_id`,`hazard_id`)
);
--> statement-breakpoint
CREATE TABLE `order_parts` (
	`id` uuid NOT NULL,
	`order_id` uuid NOT NULL,
	`kind` varchar(20) NOT NULL,
	`material` varchar(20) NOT NULL,
	`size_mm` double,
	`quantity` int NOT NULL,
	CONSTRAINT `order_parts_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `orders` (
	`id` uuid NOT NULL,
	`code` varchar(7) NOT NULL,
	`organisation_id` uuid NOT NULL,
	`crag_id` uuid NOT NULL,
	`climb_id` uuid,
	`kind` varchar(20) NOT NULL,
	`state` varchar(10) NOT NULL,
	`aim_on` date,
	`what` text NOT NULL,
	`consent_reason` text,
	`made_by` uuid,
	`worker_id` uuid,
	`closed_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `orders_id` PRIMARY KEY(`id`),
	CONSTRAINT `orders_code_unique` UNIQUE(`code`),
	CONSTRAINT `orders_kind` CHECK(`kind` in ('replace_ring', 'replace_lower_off', 'replace_bolt', 'replace_hanger', 'tighten', 'replace_connector', 'look_closely', 'other')),
	CONSTRAINT `orders_state_word` CHECK(`state` in ('draft', 'offered', 'accepted', 'done', 'checked', 'closed', 'cancelled'))
);
--> statement-breakpoint
CREATE TABLE `work_checks` (
	`id` uuid NOT NULL,
	`work_record_id` uuid NOT NULL,
	`by_person_id` uuid NOT NULL,
	`who_kind` varchar(12) NOT NULL,
	`how` varchar(12) NOT NULL,
	`outcome` varchar(10) NOT NULL,
	`words` text,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `work_checks_id` PRIMARY KEY(`id`),
	CONSTRAINT `work_checks_who` CHECK(`who_kind` in ('partner', 'independent')),
	CONSTRAINT `work_checks_how` CHECK(`how` in ('on_the_rope', 'from_photos', 'load_test'))
);
--> statement-breakpoint
CREATE TABLE `work_parts` (
	`id` uuid NOT NULL,
	`work_record_id` uuid NOT NULL,
	`replaces` uuid,
	`side` varchar(1),
	`kind` varchar(20),
	`material` varchar(20),
	`size_mm` double,
	`marking` varchar(120),
	CONSTRAINT `work_parts_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `work_records` (
	`id` uuid NOT NULL,
	`client_key` varchar(64) NOT NULL,
	`order_id` uuid,
	`anchor_id` uuid NOT NULL,
	`by_person_id` uuid NOT NULL,
	`done_on` date NOT NULL,
	`minutes` int,
	`words` text,
	`no_photo_reason` text,
	`outcome` varchar(10) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `work_records_id` PRIMARY KEY(`id`),
	CONSTRAINT `work_records_client_key_unique` UNIQUE(`client_key`)
);
--> statement-breakpoint
ALTER TABLE `anchor_points` ADD CONSTRAINT `anchor_points_anchor_id_anchors_id_fk` FOREIGN KEY (`anchor_id`) REFERENCES `anchors`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `anchors` ADD CONSTRAINT `anchors_crag_id_crags_id_fk` FOREIGN KEY (`crag_id`) REFERENCES `crags`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `anchors` ADD CONSTRAINT `anchors_replaced_by_anchors_id_fk` FOREIGN KEY (`replaced_by`) REFERENCES `anchors`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `areas` ADD CONSTRAINT `areas_parent_id_areas_id_fk` FOREIGN KEY (`parent_id`) REFERENCES `areas`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `climb_anchors` ADD CONSTRAINT `climb_anchors_climb_id_climbs_id_fk` FOREIGN KEY (`climb_id`) REFERENCES `climbs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `climb_anchors` ADD CONSTRAINT `climb_anchors_anchor_id_anchors_id_fk` FOREIGN KEY (`anchor_id`) REFERENCES `anchors`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `climb_anchors` ADD CONSTRAINT `climb_anchors_pitch_id_pitches_id_fk` FOREIGN KEY (`pitch_id`) REFERENCES `pitches`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `climbs` ADD CONSTRAINT `climbs_sector_id_sectors_id_fk` FOREIGN KEY (`sector_id`) REFERENCES `sectors`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `consents` ADD CONSTRAINT `consents_crag_id_crags_id_fk` FOREIGN KEY (`crag_id`) REFERENCES `crags`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `crag_keepers` ADD CONSTRAINT `crag_keepers_crag_id_crags_id_fk` FOREIGN KEY (`crag_id`) REFERENCES `crags`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `crag_keepers` ADD CONSTRAINT `crag_keepers_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `crag_organisations` ADD CONSTRAINT `crag_organisations_crag_id_crags_id_fk` FOREIGN KEY (`crag_id`) REFERENCES `crags`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `crag_organisations` ADD CONSTRAINT `crag_organisations_organisation_id_organisations_id_fk` FOREIGN KEY (`organisation_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `crags` ADD CONSTRAINT `crags_area_id_areas_id_fk` FOREIGN KEY (`area_id`) REFERENCES `areas`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ledges` ADD CONSTRAINT `ledges_pitch_id_pitches_id_fk` FOREIGN KEY (`pitch_id`) REFERENCES `pitches`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `parts` ADD CONSTRAINT `parts_anchor_id_anchors_id_fk` FOREIGN KEY (`anchor_id`) REFERENCES `anchors`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `parts` ADD CONSTRAINT `parts_maker_id_makers_id_fk` FOREIGN KEY (`maker_id`) REFERENCES `makers`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `pitches` ADD CONSTRAINT `pitches_climb_id_climbs_id_fk` FOREIGN KEY (`climb_id`) REFERENCES `climbs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `place_names` ADD CONSTRAINT `place_names_area_id_areas_id_fk` FOREIGN KEY (`area_id`) REFERENCES `areas`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `place_names` ADD CONSTRAINT `place_names_crag_id_crags_id_fk` FOREIGN KEY (`crag_id`) REFERENCES `crags`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `place_names` ADD CONSTRAINT `place_names_sector_id_sectors_id_fk` FOREIGN KEY (`sector_id`) REFERENCES `sectors`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `place_names` ADD CONSTRAINT `place_names_climb_id_climbs_id_fk` FOREIGN KEY (`climb_id`) REFERENCES `climbs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sectors` ADD CONSTRAINT `sectors_crag_id_crags_id_fk` FOREIGN KEY (`crag_id`) REFERENCES `crags`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `messages` ADD CONSTRAINT `messages_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notice_hazards` ADD CONSTRAINT `notice_hazards_notice_id_notices_id_fk` FOREIGN KEY (`notice_id`) REFERENCES `notices`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notice_hazards` ADD CONSTRAINT `notice_hazards_hazard_id_hazards_id_fk` FOREIGN KEY (`hazard_id`) REFERENCES `hazards`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notice_places` ADD CONSTRAINT `notice_places_notice_id_notices_id_fk` FOREIGN KEY (`notice_id`) REFERENCES `notices`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notice_places` ADD CONSTRAINT `notice_places_area_id_areas_id_fk` FOREIGN KEY (`area_id`) REFERENCES `areas`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notice_places` ADD CONSTRAINT `notice_places_crag_id_crags_id_fk` FOREIGN KEY (`crag_id`) REFERENCES `crags`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notice_places` ADD CONSTRAINT `notice_places_sector_id_sectors_id_fk` FOREIGN KEY (`sector_id`) REFERENCES `sectors`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notice_places` ADD CONSTRAINT `notice_places_climb_id_climbs_id_fk` FOREIGN KEY (`climb_id`) REFERENCES `climbs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notice_places` ADD CONSTRAINT `notice_places_anchor_id_anchors_id_fk` FOREIGN KEY (`anchor_id`) REFERENCES `anchors`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notice_revisions` ADD CONSTRAINT `notice_revisions_notice_id_notices_id_fk` FOREIGN KEY (`notice_id`) REFERENCES `notices`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notice_revisions` ADD CONSTRAINT `notice_revisions_by_person_id_people_id_fk` FOREIGN KEY (`by_person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notices` ADD CONSTRAINT `notices_organisation_id_organisations_id_fk` FOREIGN KEY (`organisation_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notices` ADD CONSTRAINT `notices_published_by_people_id_fk` FOREIGN KEY (`published_by`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notices` ADD CONSTRAINT `notices_confirmed_by_people_id_fk` FOREIGN KEY (`confirmed_by`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notices` ADD CONSTRAINT `notices_withdrawn_by_people_id_fk` FOREIGN KEY (`withdrawn_by`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `membership_roles` ADD CONSTRAINT `membership_roles_membership_id_memberships_id_fk` FOREIGN KEY (`membership_id`) REFERENCES `memberships`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `memberships` ADD CONSTRAINT `memberships_organisation_id_organisations_id_fk` FOREIGN KEY (`organisation_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `memberships` ADD CONSTRAINT `memberships_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sessions` ADD CONSTRAINT `sessions_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `rating_values` ADD CONSTRAINT `rating_values_model_id_rating_models_id_fk` FOREIGN KEY (`model_id`) REFERENCES `rating_models`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ratings` ADD CONSTRAINT `ratings_report_id_reports_id_fk` FOREIGN KEY (`report_id`) REFERENCES `reports`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ratings` ADD CONSTRAINT `ratings_hazard_id_hazards_id_fk` FOREIGN KEY (`hazard_id`) REFERENCES `hazards`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ratings` ADD CONSTRAINT `ratings_model_id_rating_models_id_fk` FOREIGN KEY (`model_id`) REFERENCES `rating_models`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `findings` ADD CONSTRAINT `findings_report_id_reports_id_fk` FOREIGN KEY (`report_id`) REFERENCES `reports`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `findings` ADD CONSTRAINT `findings_part_id_parts_id_fk` FOREIGN KEY (`part_id`) REFERENCES `parts`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `hazards` ADD CONSTRAINT `hazards_crag_id_crags_id_fk` FOREIGN KEY (`crag_id`) REFERENCES `crags`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `hazards` ADD CONSTRAINT `hazards_anchor_id_anchors_id_fk` FOREIGN KEY (`anchor_id`) REFERENCES `anchors`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `hazards` ADD CONSTRAINT `hazards_climb_id_climbs_id_fk` FOREIGN KEY (`climb_id`) REFERENCES `climbs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `hazards` ADD CONSTRAINT `hazards_sector_id_sectors_id_fk` FOREIGN KEY (`sector_id`) REFERENCES `sectors`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `hazards` ADD CONSTRAINT `hazards_part_id_parts_id_fk` FOREIGN KEY (`part_id`) REFERENCES `parts`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `hazards` ADD CONSTRAINT `hazards_joined_to_hazards_id_fk` FOREIGN KEY (`joined_to`) REFERENCES `hazards`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `photos` ADD CONSTRAINT `photos_report_id_reports_id_fk` FOREIGN KEY (`report_id`) REFERENCES `reports`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `report_anchors` ADD CONSTRAINT `report_anchors_report_id_reports_id_fk` FOREIGN KEY (`report_id`) REFERENCES `reports`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `report_anchors` ADD CONSTRAINT `report_anchors_anchor_id_anchors_id_fk` FOREIGN KEY (`anchor_id`) REFERENCES `anchors`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reports` ADD CONSTRAINT `reports_crag_id_crags_id_fk` FOREIGN KEY (`crag_id`) REFERENCES `crags`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reports` ADD CONSTRAINT `reports_climb_id_climbs_id_fk` FOREIGN KEY (`climb_id`) REFERENCES `climbs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reports` ADD CONSTRAINT `reports_anchor_id_anchors_id_fk` FOREIGN KEY (`anchor_id`) REFERENCES `anchors`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reports` ADD CONSTRAINT `reports_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reports` ADD CONSTRAINT `reports_hazard_id_hazards_id_fk` FOREIGN KEY (`hazard_id`) REFERENCES `hazards`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reports` ADD CONSTRAINT `reports_decided_by_people_id_fk` FOREIGN KEY (`decided_by`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `link_tokens` ADD CONSTRAINT `link_tokens_report_id_reports_id_fk` FOREIGN KEY (`report_id`) REFERENCES `reports`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `link_tokens` ADD CONSTRAINT `link_tokens_offer_id_offers_id_fk` FOREIGN KEY (`offer_id`) REFERENCES `offers`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `link_tokens` ADD CONSTRAINT `link_tokens_order_id_orders_id_fk` FOREIGN KEY (`order_id`) REFERENCES `orders`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `offers` ADD CONSTRAINT `offers_order_id_orders_id_fk` FOREIGN KEY (`order_id`) REFERENCES `orders`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `offers` ADD CONSTRAINT `offers_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `order_hazards` ADD CONSTRAINT `order_hazards_order_id_orders_id_fk` FOREIGN KEY (`order_id`) REFERENCES `orders`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `order_hazards` ADD CONSTRAINT `order_hazards_hazard_id_hazards_id_fk` FOREIGN KEY (`hazard_id`) REFERENCES `hazards`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `order_parts` ADD CONSTRAINT `order_parts_order_id_orders_id_fk` FOREIGN KEY (`order_id`) REFERENCES `orders`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `orders` ADD CONSTRAINT `orders_organisation_id_organisations_id_fk` FOREIGN KEY (`organisation_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `orders` ADD CONSTRAINT `orders_crag_id_crags_id_fk` FOREIGN KEY (`crag_id`) REFERENCES `crags`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `orders` ADD CONSTRAINT `orders_climb_id_climbs_id_fk` FOREIGN KEY (`climb_id`) REFERENCES `climbs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `orders` ADD CONSTRAINT `orders_made_by_people_id_fk` FOREIGN KEY (`made_by`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `orders` ADD CONSTRAINT `orders_worker_id_people_id_fk` FOREIGN KEY (`worker_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `work_checks` ADD CONSTRAINT `work_checks_work_record_id_work_records_id_fk` FOREIGN KEY (`work_record_id`) REFERENCES `work_records`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `work_checks` ADD CONSTRAINT `work_checks_by_person_id_people_id_fk` FOREIGN KEY (`by_person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `work_parts` ADD CONSTRAINT `work_parts_work_record_id_work_records_id_fk` FOREIGN KEY (`work_record_id`) REFERENCES `work_records`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `work_parts` ADD CONSTRAINT `work_parts_replaces_parts_id_fk` FOREIGN KEY (`replaces`) REFERENCES `parts`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `work_records` ADD CONSTRAINT `work_records_order_id_orders_id_fk` FOREIGN KEY (`order_id`) REFERENCES `orders`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `work_records` ADD CONSTRAINT `work_records_anchor_id_anchors_id_fk` FOREIGN KEY (`anchor_id`) REFERENCES `anchors`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `work_records` ADD CONSTRAINT `work_records_by_person_id_people_id_fk` FOREIGN KEY (`by_person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `anchors_crag` ON `anchors` (`crag_id`);--> statement-breakpoint
CREATE INDEX `anchors_lapse` ON `anchors` (`lapses_on`);--> statement-breakpoint
CREATE INDEX `climb_anchors_anchor` ON `climb_anchors` (`anchor_id`);--> statement-breakpoint
CREATE INDEX `climbs_sector` ON `climbs` (`sector_id`,`ordinal`);--> statement-breakpoint
CREATE INDEX `consents_crag` ON `consents` (`crag_id`);--> statement-breakpoint
CREATE INDEX `crags_area` ON `crags` (`area_id`);--> statement-breakpoint
CREATE INDEX `parts_anchor` ON `parts` (`anchor_id`);--> statement-breakpoint
CREATE INDEX `sectors_crag` ON `sectors` (`crag_id`,`ordinal`);--> statement-breakpoint
CREATE INDEX `messages_due` ON `messages` (`state`,`due_at`);--> statement-breakpoint
CREATE INDEX `notice_places_notice` ON `notice_places` (`notice_id`);--> statement-breakpoint
CREATE INDEX `notices_state` ON `notices` (`state`,`published_at`);--> statement-breakpoint
CREATE INDEX `sessions_person` ON `sessions` (`person_id`);--> statement-breakpoint
CREATE INDEX `sign_in_codes_email` ON `sign_in_codes` (`email`,`created_at`);--> statement-breakpoint
CREATE INDEX `sign_in_codes_network` ON `sign_in_codes` (`network`,`created_at`);--> statement-breakpoint
CREATE INDEX `ratings_hazard` ON `ratings` (`hazard_id`,`at`);--> statement-breakpoint
CREATE INDEX `ratings_report` ON `ratings` (`report_id`,`at`);--> statement-breakpoint
CREATE INDEX `activities_subject` ON `activities` (`subject_kind`,`subject_id`,`at`);--> statement-breakpoint
CREATE INDEX `activities_crag` ON `activities` (`crag_id`,`at`);--> statement-breakpoint
CREATE INDEX `jobs_due` ON `jobs` (`state`,`due_at`);--> statement-breakpoint
CREATE INDEX `findings_report` ON `findings` (`report_id`);--> statement-breakpoint
CREATE INDEX `hazards_list` ON `hazards` (`state`,`urgency_sort`,`id`);--> statement-breakpoint
CREATE INDEX `hazards_anchor` ON `hazards` (`anchor_id`);--> statement-breakpoint
CREATE INDEX `hazards_crag` ON `hazards` (`crag_id`);--> statement-breakpoint
CREATE INDEX `photos_report` ON `photos` (`report_id`);--> statement-breakpoint
CREATE INDEX `photos_record` ON `photos` (`work_record_id`);--> statement-breakpoint
CREATE INDEX `photos_staged` ON `photos` (`staged_by`,`expires_at`);--> statement-breakpoint
CREATE INDEX `reports_list` ON `reports` (`state`,`urgency_sort`,`id`);--> statement-breakpoint
CREATE INDEX `reports_anchor` ON `reports` (`anchor_id`);--> statement-breakpoint
CREATE INDEX `reports_hazard` ON `reports` (`hazard_id`);--> statement-breakpoint
CREATE INDEX `offers_order` ON `offers` (`order_id`);--> statement-breakpoint
CREATE INDEX `order_hazards_hazard` ON `order_hazards` (`hazard_id`);--> statement-breakpoint
CREATE INDEX `order_parts_order` ON `order_parts` (`order_id`);--> statement-breakpoint
CREATE INDEX `orders_state` ON `orders` (`organisation_id`,`state`);--> statement-breakpoint
CREATE INDEX `work_checks_record` ON `work_checks` (`work_record_id`);--> statement-breakpoint
CREATE INDEX `work_parts_record` ON `work_parts` (`work_record_id`);--> statement-breakpoint
CREATE INDEX `work_records_order` ON `work_records` (`order_id`);--> statement-breakpoint
CREATE INDEX `work_records_anchor` ON `work_records` (`anchor_id`);