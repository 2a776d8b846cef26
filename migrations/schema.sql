-- The schema that all migrations together make. Written by `npm run migrate -- --write-schema`;
-- a test compares it with a migrated database. Not meant to be run by hand.

CREATE TABLE `audit_log` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `actor_id` bigint(20) unsigned DEFAULT NULL,
  `act` varchar(40) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `target_kind` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `target_id` bigint(20) unsigned NOT NULL,
  `before_value` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin DEFAULT NULL CHECK (json_valid(`before_value`)),
  `after_value` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin DEFAULT NULL CHECK (json_valid(`after_value`)),
  `reason` varchar(2000) NOT NULL DEFAULT '',
  `at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`id`),
  KEY `audit_log_target_index` (`target_kind`,`target_id`,`id`),
  KEY `audit_log_actor_index` (`actor_id`,`id`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `finding_disputes` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `note_id` bigint(20) unsigned NOT NULL,
  `code` varchar(24) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `minute` double NOT NULL,
  `sentence` varchar(300) NOT NULL,
  `state` varchar(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'disputed',
  `version` int(10) unsigned NOT NULL DEFAULT 1,
  `said_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  `answer` varchar(300) NOT NULL DEFAULT '',
  `answered_by` bigint(20) unsigned DEFAULT NULL,
  `answered_at` datetime(3) DEFAULT NULL,
  PRIMARY KEY (`id`),
  UNIQUE KEY `finding_disputes_finding_unique` (`note_id`,`code`,`minute`),
  KEY `finding_disputes_state_index` (`state`,`said_at`),
  KEY `finding_disputes_answered_by_foreign` (`answered_by`),
  CONSTRAINT `finding_disputes_answered_by_foreign` FOREIGN KEY (`answered_by`) REFERENCES `members` (`id`) ON DELETE SET NULL,
  CONSTRAINT `finding_disputes_note_foreign` FOREIGN KEY (`note_id`) REFERENCES `notes` (`id`) ON DELETE CASCADE,
  CONSTRAINT `finding_disputes_state_check` CHECK (`state` in ('disputed','left','restored','withdrawn'))
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `firing_troubles` (
  `note_id` bigint(20) unsigned NOT NULL,
  `trouble` varchar(24) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `measured` tinyint(1) NOT NULL,
  `named` tinyint(1) NOT NULL,
  `disputed` tinyint(1) NOT NULL DEFAULT 0,
  PRIMARY KEY (`note_id`,`trouble`),
  KEY `firing_troubles_trouble_index` (`trouble`,`note_id`),
  CONSTRAINT `firing_troubles_note_foreign` FOREIGN KEY (`note_id`) REFERENCES `published_firings` (`note_id`) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `idempotency_keys` (
  `member_id` bigint(20) unsigned NOT NULL,
  `idempotency_key` varchar(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `route` varchar(120) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `body_hash` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `status` int(10) unsigned DEFAULT NULL,
  `answer` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin DEFAULT NULL CHECK (json_valid(`answer`)),
  `created_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`member_id`,`idempotency_key`),
  KEY `idempotency_keys_created_index` (`created_at`),
  CONSTRAINT `idempotency_keys_member_foreign` FOREIGN KEY (`member_id`) REFERENCES `members` (`id`) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `kiln_loans` (
  `kiln_id` bigint(20) unsigned NOT NULL,
  `member_id` bigint(20) unsigned NOT NULL,
  `created_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`kiln_id`,`member_id`),
  KEY `kiln_loans_member_index` (`member_id`),
  CONSTRAINT `kiln_loans_kiln_foreign` FOREIGN KEY (`kiln_id`) REFERENCES `kilns` (`id`) ON DELETE CASCADE,
  CONSTRAINT `kiln_loans_member_foreign` FOREIGN KEY (`member_id`) REFERENCES `members` (`id`) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `kiln_versions` (
  `kiln_id` bigint(20) unsigned NOT NULL,
  `version` int(10) unsigned NOT NULL,
  `fields` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`fields`)),
  `volume_litres` double DEFAULT NULL,
  `created_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`kiln_id`,`version`),
  CONSTRAINT `kiln_versions_kiln_foreign` FOREIGN KEY (`kiln_id`) REFERENCES `kilns` (`id`) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `kilns` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `keeper_id` bigint(20) unsigned DEFAULT NULL,
  `name` varchar(60) NOT NULL,
  `current_version` int(10) unsigned NOT NULL DEFAULT 1,
  `picture_id` bigint(20) unsigned DEFAULT NULL,
  `removed_at` datetime(3) DEFAULT NULL,
  `created_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`id`),
  KEY `kilns_keeper_index` (`keeper_id`),
  CONSTRAINT `kilns_keeper_foreign` FOREIGN KEY (`keeper_id`) REFERENCES `members` (`id`) ON DELETE SET NULL
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `mail_tokens` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `member_id` bigint(20) unsigned NOT NULL,
  `kind` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `token_hash` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `new_email` varchar(254) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `expires_at` datetime(3) NOT NULL,
  `used_at` datetime(3) DEFAULT NULL,
  `created_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`id`),
  UNIQUE KEY `mail_tokens_hash_unique` (`token_hash`),
  KEY `mail_tokens_member_index` (`member_id`,`kind`),
  CONSTRAINT `mail_tokens_member_foreign` FOREIGN KEY (`member_id`) REFERENCES `members` (`id`) ON DELETE CASCADE,
  CONSTRAINT `mail_tokens_kind_check` CHECK (`kind` in ('verify-email','reset','change-email'))
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `members` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `email` varchar(254) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `email_verified_at` datetime(3) DEFAULT NULL,
  `name` varchar(60) NOT NULL,
  `name_key` varchar(190) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
  `role` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'member',
  `password_hash` varchar(200) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `place` varchar(80) NOT NULL DEFAULT '',
  `about` varchar(1000) NOT NULL DEFAULT '',
  `settings` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`settings`)),
  `suspended_at` datetime(3) DEFAULT NULL,
  `created_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`id`),
  UNIQUE KEY `members_email_unique` (`email`),
  UNIQUE KEY `members_name_key_unique` (`name_key`),
  CONSTRAINT `members_role_check` CHECK (`role` in ('member','moderator','admin'))
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `note_questions` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `note_id` bigint(20) unsigned NOT NULL,
  `asker_id` bigint(20) unsigned DEFAULT NULL,
  `text` varchar(500) NOT NULL,
  `asked_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`id`),
  KEY `note_questions_note_index` (`note_id`,`id`),
  KEY `note_questions_asker_index` (`asker_id`),
  CONSTRAINT `note_questions_asker_foreign` FOREIGN KEY (`asker_id`) REFERENCES `members` (`id`) ON DELETE SET NULL,
  CONSTRAINT `note_questions_note_foreign` FOREIGN KEY (`note_id`) REFERENCES `notes` (`id`) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `note_revisions` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `note_id` bigint(20) unsigned NOT NULL,
  `number` int(10) unsigned NOT NULL,
  `fields` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`fields`)),
  `story_html` mediumtext NOT NULL,
  `kiln_id` bigint(20) unsigned NOT NULL,
  `kiln_version` int(10) unsigned NOT NULL,
  `record_content_id` bigint(20) unsigned DEFAULT NULL,
  `findings` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`findings`)),
  `checks` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`checks`)),
  `facts` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`facts`)),
  `strip` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin DEFAULT NULL CHECK (json_valid(`strip`)),
  `strip_words` varchar(400) NOT NULL DEFAULT '',
  `created_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`id`),
  UNIQUE KEY `note_revisions_number_unique` (`note_id`,`number`),
  KEY `note_revisions_record_index` (`record_content_id`),
  KEY `note_revisions_kiln_foreign` (`kiln_id`,`kiln_version`),
  CONSTRAINT `note_revisions_kiln_foreign` FOREIGN KEY (`kiln_id`, `kiln_version`) REFERENCES `kiln_versions` (`kiln_id`, `version`),
  CONSTRAINT `note_revisions_note_foreign` FOREIGN KEY (`note_id`) REFERENCES `notes` (`id`) ON DELETE CASCADE,
  CONSTRAINT `note_revisions_record_foreign` FOREIGN KEY (`record_content_id`) REFERENCES `record_contents` (`id`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `notes` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `author_id` bigint(20) unsigned DEFAULT NULL,
  `status` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'draft',
  `version` int(10) unsigned NOT NULL DEFAULT 1,
  `draft` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`draft`)),
  `draft_saved_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  `handed_in_revision_id` bigint(20) unsigned DEFAULT NULL,
  `handed_in_at` datetime(3) DEFAULT NULL,
  `published_revision_id` bigint(20) unsigned DEFAULT NULL,
  `published_at` datetime(3) DEFAULT NULL,
  `revised_at` datetime(3) DEFAULT NULL,
  `claimed_by` bigint(20) unsigned DEFAULT NULL,
  `claimed_until` datetime(3) DEFAULT NULL,
  `kiln_id` bigint(20) unsigned DEFAULT NULL,
  `fired_on` date DEFAULT NULL,
  `fired_at_time` char(5) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `removed_at` datetime(3) DEFAULT NULL,
  `created_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`id`),
  KEY `notes_author_index` (`author_id`,`draft_saved_at`),
  KEY `notes_published_index` (`published_at`,`id`),
  KEY `notes_desk_index` (`status`,`handed_in_at`),
  KEY `notes_kiln_index` (`kiln_id`,`fired_on`,`fired_at_time`),
  KEY `notes_claimed_by_foreign` (`claimed_by`),
  KEY `notes_handed_in_foreign` (`handed_in_revision_id`),
  KEY `notes_published_foreign` (`published_revision_id`),
  CONSTRAINT `notes_author_foreign` FOREIGN KEY (`author_id`) REFERENCES `members` (`id`) ON DELETE SET NULL,
  CONSTRAINT `notes_claimed_by_foreign` FOREIGN KEY (`claimed_by`) REFERENCES `members` (`id`) ON DELETE SET NULL,
  CONSTRAINT `notes_handed_in_foreign` FOREIGN KEY (`handed_in_revision_id`) REFERENCES `note_revisions` (`id`),
  CONSTRAINT `notes_kiln_foreign` FOREIGN KEY (`kiln_id`) REFERENCES `kilns` (`id`) ON DELETE SET NULL,
  CONSTRAINT `notes_published_foreign` FOREIGN KEY (`published_revision_id`) REFERENCES `note_revisions` (`id`),
  CONSTRAINT `notes_status_check` CHECK (`status` in ('draft','handed-in','on-the-desk','sent-back','published','declined','taken-down'))
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `outbox` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `topic` varchar(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `dedupe_key` varchar(160) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `payload` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`payload`)),
  `attempts` int(10) unsigned NOT NULL DEFAULT 0,
  `available_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  `leased_until` datetime(3) DEFAULT NULL,
  `lease_token` char(32) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `done_at` datetime(3) DEFAULT NULL,
  `given_up_at` datetime(3) DEFAULT NULL,
  `last_error` varchar(1000) NOT NULL DEFAULT '',
  `created_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`id`),
  UNIQUE KEY `outbox_dedupe_unique` (`topic`,`dedupe_key`),
  KEY `outbox_due_index` (`topic`,`done_at`,`given_up_at`,`available_at`,`id`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `pictures` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `name` char(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `owner_id` bigint(20) unsigned DEFAULT NULL,
  `note_id` bigint(20) unsigned DEFAULT NULL,
  `kiln_id` bigint(20) unsigned DEFAULT NULL,
  `width` int(10) unsigned NOT NULL,
  `height` int(10) unsigned NOT NULL,
  `widths` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`widths`)),
  `placeholder` varchar(2000) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `bytes` int(10) unsigned NOT NULL,
  `taken_off_at` datetime(3) DEFAULT NULL,
  `created_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`id`),
  UNIQUE KEY `pictures_name_unique` (`name`),
  KEY `pictures_note_index` (`note_id`),
  KEY `pictures_kiln_index` (`kiln_id`),
  KEY `pictures_owner_index` (`owner_id`),
  CONSTRAINT `pictures_kiln_foreign` FOREIGN KEY (`kiln_id`) REFERENCES `kilns` (`id`) ON DELETE CASCADE,
  CONSTRAINT `pictures_note_foreign` FOREIGN KEY (`note_id`) REFERENCES `notes` (`id`) ON DELETE CASCADE,
  CONSTRAINT `pictures_owner_foreign` FOREIGN KEY (`owner_id`) REFERENCES `members` (`id`) ON DELETE SET NULL
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `published_climbs` (
  `note_id` bigint(20) unsigned NOT NULL,
  `revision_id` bigint(20) unsigned NOT NULL,
  `version` smallint(5) unsigned NOT NULL,
  `signature` varbinary(360) DEFAULT NULL,
  `traits` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin DEFAULT NULL CHECK (json_valid(`traits`)),
  `kept_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`note_id`),
  KEY `published_climbs_kept_index` (`kept_at`),
  CONSTRAINT `published_climbs_note_foreign` FOREIGN KEY (`note_id`) REFERENCES `notes` (`id`) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `published_figures` (
  `note_id` bigint(20) unsigned NOT NULL,
  `version` smallint(5) unsigned NOT NULL,
  `numbers` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`numbers`)),
  PRIMARY KEY (`note_id`),
  KEY `published_figures_version_index` (`version`,`note_id`),
  CONSTRAINT `published_figures_note_foreign` FOREIGN KEY (`note_id`) REFERENCES `published_firings` (`note_id`) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `published_firings` (
  `note_id` bigint(20) unsigned NOT NULL,
  `revision_id` bigint(20) unsigned NOT NULL,
  `kiln_id` bigint(20) unsigned NOT NULL,
  `author_id` bigint(20) unsigned DEFAULT NULL,
  `fired_on` date NOT NULL,
  `fired_at_time` char(5) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `tried_note_id` bigint(20) unsigned DEFAULT NULL,
  `slug` varchar(140) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `title` varchar(120) NOT NULL,
  `facts` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`facts`)),
  `note_row` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`note_row`)),
  `story_text` mediumtext NOT NULL,
  `published_at` datetime(3) NOT NULL,
  PRIMARY KEY (`note_id`),
  KEY `published_firings_kiln_index` (`kiln_id`,`fired_on`,`fired_at_time`,`note_id`),
  KEY `published_firings_newest_index` (`published_at`,`note_id`),
  KEY `published_firings_author_index` (`author_id`,`published_at`),
  KEY `published_firings_tried_index` (`tried_note_id`),
  KEY `published_firings_revision_foreign` (`revision_id`),
  FULLTEXT KEY `published_firings_text` (`title`,`story_text`),
  CONSTRAINT `published_firings_note_foreign` FOREIGN KEY (`note_id`) REFERENCES `notes` (`id`) ON DELETE CASCADE,
  CONSTRAINT `published_firings_revision_foreign` FOREIGN KEY (`revision_id`) REFERENCES `note_revisions` (`id`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `question_answers` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `question_id` bigint(20) unsigned NOT NULL,
  `member_id` bigint(20) unsigned DEFAULT NULL,
  `text` varchar(2000) NOT NULL,
  `answered_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  `changed_at` datetime(3) DEFAULT NULL,
  PRIMARY KEY (`id`),
  UNIQUE KEY `question_answers_member_unique` (`question_id`,`member_id`),
  KEY `question_answers_member_index` (`member_id`),
  CONSTRAINT `question_answers_member_foreign` FOREIGN KEY (`member_id`) REFERENCES `members` (`id`) ON DELETE SET NULL,
  CONSTRAINT `question_answers_question_foreign` FOREIGN KEY (`question_id`) REFERENCES `note_questions` (`id`) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `record_contents` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `sha256` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `readings` longblob NOT NULL,
  `second_probe` longblob DEFAULT NULL,
  `count` int(10) unsigned NOT NULL,
  `strip` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`strip`)),
  `created_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`id`),
  UNIQUE KEY `record_contents_sha256_unique` (`sha256`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `records` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `note_id` bigint(20) unsigned NOT NULL,
  `source` varchar(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `file_name` varchar(255) NOT NULL DEFAULT '',
  `status` varchar(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'reading',
  `storage_key` varchar(80) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `choice` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`choice`)),
  `content_id` bigint(20) unsigned DEFAULT NULL,
  `unit` char(1) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `assumed` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`assumed`)),
  `skipped` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`skipped`)),
  `skipped_count` int(10) unsigned NOT NULL DEFAULT 0,
  `error` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin DEFAULT NULL CHECK (json_valid(`error`)),
  `created_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`id`),
  KEY `records_note_index` (`note_id`),
  KEY `records_content_index` (`content_id`),
  CONSTRAINT `records_content_foreign` FOREIGN KEY (`content_id`) REFERENCES `record_contents` (`id`),
  CONSTRAINT `records_note_foreign` FOREIGN KEY (`note_id`) REFERENCES `notes` (`id`) ON DELETE CASCADE,
  CONSTRAINT `records_source_check` CHECK (`source` in ('file','pasted','typed')),
  CONSTRAINT `records_status_check` CHECK (`status` in ('reading','ready','failed'))
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `remarks` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `note_id` bigint(20) unsigned NOT NULL,
  `revision_id` bigint(20) unsigned NOT NULL,
  `moderator_id` bigint(20) unsigned DEFAULT NULL,
  `pointer` varchar(120) NOT NULL,
  `text` varchar(1000) NOT NULL,
  `sent_at` datetime(3) DEFAULT NULL,
  `mended_at` datetime(3) DEFAULT NULL,
  `created_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  PRIMARY KEY (`id`),
  KEY `remarks_note_index` (`note_id`,`created_at`),
  KEY `remarks_revision_foreign` (`revision_id`),
  KEY `remarks_moderator_foreign` (`moderator_id`),
  CONSTRAINT `remarks_moderator_foreign` FOREIGN KEY (`moderator_id`) REFERENCES `members` (`id`) ON DELETE SET NULL,
  CONSTRAINT `remarks_note_foreign` FOREIGN KEY (`note_id`) REFERENCES `notes` (`id`) ON DELETE CASCADE,
  CONSTRAINT `remarks_revision_foreign` FOREIGN KEY (`revision_id`) REFERENCES `note_revisions` (`id`) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `revision_pictures` (
  `revision_id` bigint(20) unsigned NOT NULL,
  `picture_id` bigint(20) unsigned NOT NULL,
  PRIMARY KEY (`revision_id`,`picture_id`),
  KEY `revision_pictures_picture_index` (`picture_id`),
  CONSTRAINT `revision_pictures_picture_foreign` FOREIGN KEY (`picture_id`) REFERENCES `pictures` (`id`) ON DELETE CASCADE,
  CONSTRAINT `revision_pictures_revision_foreign` FOREIGN KEY (`revision_id`) REFERENCES `note_revisions` (`id`) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `saved_searches` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `member_id` bigint(20) unsigned NOT NULL,
  `name` varchar(80) NOT NULL,
  `search` varchar(5000) NOT NULL,
  `mails` tinyint(1) NOT NULL DEFAULT 1,
  `saved_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  `looked_until` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  `mailed_at` datetime(3) DEFAULT NULL,
  PRIMARY KEY (`id`),
  KEY `saved_searches_member_index` (`member_id`,`id`),
  CONSTRAINT `saved_searches_member_foreign` FOREIGN KEY (`member_id`) REFERENCES `members` (`id`) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `sessions` (
  `id_hash` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `member_id` bigint(20) unsigned DEFAULT NULL,
  `data` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`data`)),
  `browser` varchar(200) NOT NULL DEFAULT '',
  `started_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  `seen_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
  `expires_at` datetime(3) NOT NULL,
  `ends_at` datetime(3) NOT NULL,
  PRIMARY KEY (`id_hash`),
  KEY `sessions_member_index` (`member_id`),
  KEY `sessions_expires_index` (`expires_at`),
  CONSTRAINT `sessions_member_foreign` FOREIGN KEY (`member_id`) REFERENCES `members` (`id`) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TABLE `throttles` (
  `key_hash` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `count` int(10) unsigned NOT NULL,
  `window_ends_at` datetime(3) NOT NULL,
  PRIMARY KEY (`key_hash`),
  KEY `throttles_window_index` (`window_ends_at`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci;

CREATE TRIGGER audit_log_no_delete BEFORE DELETE ON audit_log FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'audit_log is append-only';

CREATE TRIGGER audit_log_no_update BEFORE UPDATE ON audit_log FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'audit_log is append-only';
