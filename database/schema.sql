CREATE TABLE `access_grants` (
  `id` uuid NOT NULL,
  `user_id` uuid NOT NULL,
  `patient_id` uuid NOT NULL,
  `ward_id` uuid NOT NULL COMMENT 'where the patient was when the reason was given',
  `reason` varchar(500) NOT NULL,
  `granted_at` datetime(3) NOT NULL,
  `ends_at` datetime(3) NOT NULL,
  PRIMARY KEY (`id`),
  KEY `access_grants_in_force` (`user_id`,`patient_id`,`ends_at`),
  KEY `access_grants_of_ward` (`ward_id`,`granted_at`),
  KEY `access_grants_patient` (`patient_id`),
  CONSTRAINT `access_grants_patient` FOREIGN KEY (`patient_id`) REFERENCES `patients` (`id`),
  CONSTRAINT `access_grants_user` FOREIGN KEY (`user_id`) REFERENCES `users` (`id`),
  CONSTRAINT `access_grants_ward` FOREIGN KEY (`ward_id`) REFERENCES `wards` (`id`),
  CONSTRAINT `access_grants_have_a_reason` CHECK (char_length(trim(`reason`)) >= 10),
  CONSTRAINT `access_grants_end` CHECK (`ends_at` > `granted_at`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `access_log` (
  `chain` varchar(48) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `seq` int(10) unsigned NOT NULL,
  `at` datetime(3) NOT NULL,
  `actor_id` uuid DEFAULT NULL,
  `actor_role` varchar(32) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL COMMENT 'at that moment',
  `session_hash` char(64) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `purpose` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `action` varchar(48) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `outcome` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `resource_type` varchar(32) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `resource_id` varchar(64) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `patient_id` uuid DEFAULT NULL,
  `stay_id` uuid DEFAULT NULL,
  `ward_id` uuid DEFAULT NULL,
  `path` varchar(200) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `address` varchar(45) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `user_agent` varchar(200) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `request_id` varchar(64) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `prev_hash` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `hash` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  PRIMARY KEY (`chain`,`seq`),
  KEY `access_log_of_ward` (`ward_id`,`at`),
  KEY `access_log_of_actor` (`actor_id`,`at`),
  CONSTRAINT `access_log_purpose_is_known` CHECK (`purpose` in ('TREAT','BTG','ADMIN','SIGN-IN')),
  CONSTRAINT `access_log_outcome_is_known` CHECK (`outcome` in ('done','refused','failed'))
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `access_log_heads` (
  `chain` varchar(48) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `seq` int(10) unsigned NOT NULL,
  `hash` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  PRIMARY KEY (`chain`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `beds` (
  `id` uuid NOT NULL,
  `ward_id` uuid NOT NULL,
  `label` varchar(16) NOT NULL,
  `position` smallint(5) unsigned NOT NULL COMMENT 'order on the board, from 1',
  `retired` tinyint(1) NOT NULL DEFAULT 0,
  PRIMARY KEY (`id`),
  UNIQUE KEY `beds_label` (`ward_id`,`label`),
  UNIQUE KEY `beds_with_ward` (`id`,`ward_id`),
  CONSTRAINT `beds_ward` FOREIGN KEY (`ward_id`) REFERENCES `wards` (`id`),
  CONSTRAINT `beds_are_labelled` CHECK (char_length(trim(`label`)) > 0)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `bed_moves` (
  `id` uuid NOT NULL COMMENT 'minted when the form was opened: the same move twice is one',
  `stay_id` uuid NOT NULL,
  `ward_id` uuid NOT NULL COMMENT 'where to',
  `bed_id` uuid NOT NULL,
  `moved_at` datetime(3) NOT NULL,
  `recorded_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  `recorded_by` uuid NOT NULL,
  PRIMARY KEY (`id`),
  KEY `bed_moves_of_stay` (`stay_id`,`moved_at`),
  KEY `bed_moves_bed` (`bed_id`,`ward_id`),
  KEY `bed_moves_recorded_by` (`recorded_by`),
  CONSTRAINT `bed_moves_bed` FOREIGN KEY (`bed_id`, `ward_id`) REFERENCES `beds` (`id`, `ward_id`),
  CONSTRAINT `bed_moves_recorded_by` FOREIGN KEY (`recorded_by`) REFERENCES `users` (`id`),
  CONSTRAINT `bed_moves_stay` FOREIGN KEY (`stay_id`) REFERENCES `stays` (`id`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `calendar_feeds` (
  `secret_hash` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `user_id` uuid NOT NULL,
  `made_at` datetime(3) NOT NULL,
  `revoked_at` datetime(3) DEFAULT NULL,
  PRIMARY KEY (`secret_hash`),
  KEY `calendar_feeds_of_user` (`user_id`,`revoked_at`),
  CONSTRAINT `calendar_feeds_user` FOREIGN KEY (`user_id`) REFERENCES `users` (`id`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `catalogue_changes` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `subject` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `subject_id` uuid NOT NULL,
  `what` varchar(64) NOT NULL COMMENT 'in words: tube added, tube retired',
  `changed_by` uuid NOT NULL,
  `changed_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  `old_values` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin DEFAULT NULL COMMENT 'only what changed; null: it is new' CHECK (json_valid(`old_values`)),
  `new_values` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`new_values`)),
  PRIMARY KEY (`id`),
  KEY `catalogue_changes_of_subject` (`subject_id`,`id`),
  KEY `catalogue_changes_changed_by` (`changed_by`),
  CONSTRAINT `catalogue_changes_changed_by` FOREIGN KEY (`changed_by`) REFERENCES `users` (`id`),
  CONSTRAINT `catalogue_changes_subject_is_known` CHECK (`subject` in ('line','tube','inner cannula'))
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `competences` (
  `id` uuid NOT NULL COMMENT 'minted when the form was opened: the same id twice is the same sign-off',
  `user_id` uuid NOT NULL,
  `skill` varchar(48) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `level` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `assessed_on` date NOT NULL,
  `expires_on` date NOT NULL,
  `assessed_by` uuid NOT NULL,
  `assessed_role` varchar(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'at that moment',
  `signed_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  PRIMARY KEY (`id`),
  KEY `competences_of_user` (`user_id`,`skill`,`signed_at`),
  KEY `competences_assessed_by` (`assessed_by`),
  CONSTRAINT `competences_assessed_by` FOREIGN KEY (`assessed_by`) REFERENCES `users` (`id`),
  CONSTRAINT `competences_user` FOREIGN KEY (`user_id`) REFERENCES `users` (`id`),
  CONSTRAINT `competences_level_is_known` CHECK (`level` in ('supervised','independent','assessor')),
  CONSTRAINT `competences_are_assessed_by_another` CHECK (`assessed_by` <> `user_id`),
  CONSTRAINT `competences_expire` CHECK (`expires_on` > `assessed_on`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `competence_withdrawals` (
  `competence_id` uuid NOT NULL,
  `withdrawn_by` uuid NOT NULL,
  `reason` varchar(500) NOT NULL,
  `withdrawn_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  PRIMARY KEY (`competence_id`),
  KEY `competence_withdrawals_withdrawn_by` (`withdrawn_by`),
  CONSTRAINT `competence_withdrawals_competence` FOREIGN KEY (`competence_id`) REFERENCES `competences` (`id`),
  CONSTRAINT `competence_withdrawals_withdrawn_by` FOREIGN KEY (`withdrawn_by`) REFERENCES `users` (`id`),
  CONSTRAINT `competence_withdrawals_have_a_reason` CHECK (char_length(trim(`reason`)) > 0)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `countersignatures` (
  `entry_id` uuid NOT NULL,
  `signed_by` uuid NOT NULL,
  `signed_role` varchar(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'at that moment',
  `signed_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  `hash` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'SHA-256 of the hash of the entry and this row; set by trigger',
  PRIMARY KEY (`entry_id`),
  KEY `countersignatures_signed_by` (`signed_by`),
  CONSTRAINT `countersignatures_entry` FOREIGN KEY (`entry_id`) REFERENCES `entries` (`id`),
  CONSTRAINT `countersignatures_signed_by` FOREIGN KEY (`signed_by`) REFERENCES `users` (`id`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `drafts` (
  `user_id` uuid NOT NULL,
  `path` varchar(200) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `fields` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL COMMENT 'each name with its values, as the form sent them' CHECK (json_valid(`fields`)),
  `saved_at` datetime(3) NOT NULL,
  PRIMARY KEY (`user_id`,`path`),
  KEY `drafts_by_age` (`saved_at`),
  CONSTRAINT `drafts_user` FOREIGN KEY (`user_id`) REFERENCES `users` (`id`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `entries` (
  `id` uuid NOT NULL COMMENT 'minted when the form was opened: the same id twice is the same act',
  `stay_id` uuid NOT NULL,
  `number` int(10) unsigned NOT NULL COMMENT 'from 1 without gaps in each stay; set by trigger',
  `kind` varchar(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `version` smallint(5) unsigned NOT NULL COMMENT 'of the payload, by the upgrades of its kind',
  `performed_at` datetime(3) NOT NULL,
  `recorded_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  `recorded_by` uuid NOT NULL,
  `recorded_role` varchar(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'at that moment',
  `witness_id` uuid DEFAULT NULL,
  `supersedes_id` uuid DEFAULT NULL,
  `reason` varchar(500) DEFAULT NULL,
  `status` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'final',
  `data` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`data`)),
  `hash` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'SHA-256 of the hash before it and this row; set by trigger',
  `lot` varchar(20) GENERATED ALWAYS AS (json_value(`data`,'$.lot')) VIRTUAL COMMENT 'of the device that was charted, for recalls',
  `under_supervision` tinyint(1) GENERATED ALWAYS AS (right(`recorded_role`,18) = ' under supervision') VIRTUAL,
  PRIMARY KEY (`id`),
  UNIQUE KEY `entries_number` (`stay_id`,`number`),
  UNIQUE KEY `entries_supersedes` (`supersedes_id`),
  KEY `entries_timeline` (`stay_id`,`performed_at`,`id`),
  KEY `entries_by_kind` (`stay_id`,`kind`,`performed_at`,`id`),
  KEY `entries_recorded_by` (`recorded_by`),
  KEY `entries_witness` (`witness_id`),
  KEY `entries_by_lot` (`lot`),
  KEY `entries_under_supervision` (`under_supervision`,`stay_id`),
  CONSTRAINT `entries_recorded_by` FOREIGN KEY (`recorded_by`) REFERENCES `users` (`id`),
  CONSTRAINT `entries_stay` FOREIGN KEY (`stay_id`) REFERENCES `stays` (`id`),
  CONSTRAINT `entries_supersede` FOREIGN KEY (`supersedes_id`) REFERENCES `entries` (`id`),
  CONSTRAINT `entries_witness` FOREIGN KEY (`witness_id`) REFERENCES `users` (`id`),
  CONSTRAINT `entries_data_is_object` CHECK (json_type(`data`) = 'OBJECT'),
  CONSTRAINT `entries_data_is_small` CHECK (octet_length(`data`) <= 65535),
  CONSTRAINT `entries_kind_is_a_slug` CHECK (`kind` regexp '^[a-z]([a-z0-9-]*[a-z0-9])?$'),
  CONSTRAINT `entries_are_counted` CHECK (`number` > 0 and `version` > 0),
  CONSTRAINT `entries_status_is_known` CHECK (`status` in ('final','retracted')),
  CONSTRAINT `entries_retract_another` CHECK (`status` = 'final' or `supersedes_id` is not null),
  CONSTRAINT `entries_correct_with_a_reason` CHECK (`supersedes_id` is null or `reason` is not null and char_length(trim(`reason`)) > 0),
  CONSTRAINT `entries_have_happened` CHECK (`performed_at` <= `recorded_at` + interval 2 minute),
  CONSTRAINT `entries_are_witnessed_by_another` CHECK (`witness_id` is null or `witness_id` <> `recorded_by`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `entry_signatures` (
  `entry_id` uuid NOT NULL,
  `part` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `user_id` uuid NOT NULL,
  `role` varchar(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'at that moment',
  `proof` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'not given: asked for, and charted without',
  `competence` varchar(16) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL COMMENT 'for this act, at that moment; null: not asked for',
  `signed_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  `hash` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'SHA-256 of the hash of the entry and this row; set by trigger',
  PRIMARY KEY (`entry_id`,`part`),
  KEY `entry_signatures_user` (`user_id`),
  CONSTRAINT `entry_signatures_entry` FOREIGN KEY (`entry_id`) REFERENCES `entries` (`id`),
  CONSTRAINT `entry_signatures_user` FOREIGN KEY (`user_id`) REFERENCES `users` (`id`),
  CONSTRAINT `entry_signatures_part_is_known` CHECK (`part` in ('author','second person')),
  CONSTRAINT `entry_signatures_proof_is_known` CHECK (`proof` in ('password','recent sign-in','session','not given')),
  CONSTRAINT `entry_signatures_second_by_password` CHECK (`part` = 'author' or `proof` = 'password'),
  CONSTRAINT `entry_signatures_competence_is_known` CHECK (`competence` in ('held','supervised','out of date','missing'))
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `inner_cannulas` (
  `id` uuid NOT NULL,
  `line_id` uuid NOT NULL,
  `size` varchar(12) NOT NULL COMMENT 'as on the label',
  `used_as` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `fenestrated` tinyint(1) NOT NULL,
  `pack_size` smallint(5) unsigned NOT NULL,
  `gtin` char(14) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `retired_at` datetime(3) DEFAULT NULL,
  `version` int(10) unsigned NOT NULL DEFAULT 1 COMMENT 'raised by each edit, so that two at once are noticed',
  PRIMARY KEY (`id`),
  UNIQUE KEY `inner_cannulas_described` (`line_id`,`size`,`used_as`,`fenestrated`,`pack_size`),
  UNIQUE KEY `inner_cannulas_gtin` (`gtin`),
  CONSTRAINT `inner_cannulas_line` FOREIGN KEY (`line_id`) REFERENCES `tube_lines` (`id`),
  CONSTRAINT `inner_cannulas_have_a_size` CHECK (char_length(trim(`size`)) > 0),
  CONSTRAINT `inner_cannulas_use_is_known` CHECK (`used_as` in ('disposable','reusable')),
  CONSTRAINT `inner_cannulas_come_in_packs` CHECK (`pack_size` > 0),
  CONSTRAINT `inner_cannulas_gtin_is_digits` CHECK (`gtin` is null or `gtin` regexp '^[0-9]{14}$')
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `inner_cannula_fits` (
  `tube_id` uuid NOT NULL,
  `inner_cannula_id` uuid NOT NULL,
  PRIMARY KEY (`tube_id`,`inner_cannula_id`),
  KEY `inner_cannula_fits_cannula` (`inner_cannula_id`,`tube_id`),
  CONSTRAINT `inner_cannula_fits_inner_cannula` FOREIGN KEY (`inner_cannula_id`) REFERENCES `inner_cannulas` (`id`),
  CONSTRAINT `inner_cannula_fits_tube` FOREIGN KEY (`tube_id`) REFERENCES `tubes` (`id`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `installation` (
  `name` varchar(48) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'demo: the hospital that was invented, and when',
  `value` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`value`)),
  `set_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  PRIMARY KEY (`name`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `lot_recalls` (
  `id` uuid NOT NULL,
  `lot` varchar(20) NOT NULL,
  `line` varchar(120) DEFAULT NULL COMMENT 'null: whatever the line',
  `is_recalled` tinyint(1) NOT NULL COMMENT 'false: the recall before it is lifted',
  `reason` varchar(500) NOT NULL,
  `decided_by` uuid NOT NULL,
  `decided_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  `number` bigint(20) unsigned NOT NULL AUTO_INCREMENT COMMENT 'the order of the decisions',
  PRIMARY KEY (`id`),
  UNIQUE KEY `lot_recalls_number` (`number`),
  KEY `lot_recalls_by_lot` (`lot`,`number`),
  KEY `lot_recalls_decided_by` (`decided_by`),
  CONSTRAINT `lot_recalls_decided_by` FOREIGN KEY (`decided_by`) REFERENCES `users` (`id`),
  CONSTRAINT `lot_recalls_say_why` CHECK (char_length(trim(`reason`)) > 0 and char_length(trim(`lot`)) > 0)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `patients` (
  `id` uuid NOT NULL,
  `record_number` varchar(32) NOT NULL,
  `family_name` varchar(80) NOT NULL,
  `given_name` varchar(80) NOT NULL,
  `born_on` date NOT NULL,
  `sex` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `allergies` varchar(500) DEFAULT NULL COMMENT 'null: nobody has asked; that there are none is written in words',
  `upper_airway` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'not open: after laryngectomy',
  `laryngoscopy` char(1) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL COMMENT 'view at laryngoscopy, by its grade',
  `airway_notes` varchar(500) DEFAULT NULL,
  `ventilated` tinyint(1) NOT NULL,
  `oxygen` varchar(120) DEFAULT NULL COMMENT 'as prescribed, in words',
  `spo2_low` tinyint(3) unsigned DEFAULT NULL COMMENT 'prescribed target in %',
  `spo2_high` tinyint(3) unsigned DEFAULT NULL,
  `demo` tinyint(1) NOT NULL DEFAULT 0 COMMENT 'invented, to learn with',
  `version` int(10) unsigned NOT NULL DEFAULT 1 COMMENT 'raised by each edit, so that two at once are noticed',
  `created_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  PRIMARY KEY (`id`),
  UNIQUE KEY `patients_record_number` (`record_number`),
  KEY `patients_by_name` (`family_name`,`given_name`),
  CONSTRAINT `patients_are_named` CHECK (char_length(trim(`family_name`)) > 0 and char_length(trim(`given_name`)) > 0),
  CONSTRAINT `patients_have_a_number` CHECK (char_length(trim(`record_number`)) > 0),
  CONSTRAINT `patients_sex_is_known` CHECK (`sex` in ('female','male','other','not known')),
  CONSTRAINT `patients_upper_airway_is_known` CHECK (`upper_airway` in ('open','not open','not known')),
  CONSTRAINT `patients_spo2_target` CHECK (`spo2_low` is null and `spo2_high` is null or `spo2_low` is not null and `spo2_high` is not null and `spo2_low` between 50 and `spo2_high` and `spo2_high` <= 100),
  CONSTRAINT `patients_laryngoscopy_is_a_grade` CHECK (`laryngoscopy` in ('1','2','3','4'))
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `photographs` (
  `id` uuid NOT NULL COMMENT 'of the entry and the content: the same form twice is the same photograph',
  `entry_id` uuid NOT NULL COMMENT 'with which it was added; a correction may keep it',
  `stay_id` uuid NOT NULL,
  `file` uuid NOT NULL COMMENT 'the name of its files in the store',
  `width` smallint(5) unsigned NOT NULL,
  `height` smallint(5) unsigned NOT NULL,
  `bytes` int(10) unsigned NOT NULL,
  `sha256` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'of the file in the store',
  `added_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  PRIMARY KEY (`id`),
  UNIQUE KEY `photographs_file` (`file`),
  KEY `photographs_of_entry` (`entry_id`),
  KEY `photographs_stay` (`stay_id`),
  CONSTRAINT `photographs_entry` FOREIGN KEY (`entry_id`) REFERENCES `entries` (`id`),
  CONSTRAINT `photographs_stay` FOREIGN KEY (`stay_id`) REFERENCES `stays` (`id`),
  CONSTRAINT `photographs_have_a_size` CHECK (`width` > 0 and `height` > 0 and `bytes` > 0)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `policies` (
  `id` uuid NOT NULL,
  `name` varchar(120) NOT NULL,
  `version` int(10) unsigned NOT NULL COMMENT 'from 1, for each ward and for the hospital',
  `ward_id` uuid DEFAULT NULL COMMENT 'null: the whole hospital',
  `rule_set` varchar(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'adults',
  `reviewed_by` varchar(120) NOT NULL COMMENT 'empty: by nobody yet, so never in force',
  `reviewer_id` uuid DEFAULT NULL COMMENT 'null: reviewed by somebody from outside',
  `reviewed_on` date NOT NULL,
  `starts_at` datetime(3) NOT NULL,
  `reason` varchar(500) NOT NULL,
  `created_by` uuid DEFAULT NULL COMMENT 'null: came with the program',
  `created_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  `setting_values` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`setting_values`)),
  `scope` char(36) CHARACTER SET ascii COLLATE ascii_bin GENERATED ALWAYS AS (coalesce(cast(`ward_id` as char charset utf8mb4),'hospital')) VIRTUAL,
  PRIMARY KEY (`id`),
  UNIQUE KEY `policies_version` (`scope`,`rule_set`,`version`),
  KEY `policies_ward` (`ward_id`),
  KEY `policies_created_by` (`created_by`),
  KEY `policies_reviewer` (`reviewer_id`),
  CONSTRAINT `policies_created_by` FOREIGN KEY (`created_by`) REFERENCES `users` (`id`),
  CONSTRAINT `policies_reviewer` FOREIGN KEY (`reviewer_id`) REFERENCES `users` (`id`),
  CONSTRAINT `policies_ward` FOREIGN KEY (`ward_id`) REFERENCES `wards` (`id`),
  CONSTRAINT `policies_have_a_reason` CHECK (char_length(trim(`reason`)) > 0),
  CONSTRAINT `policies_values_are_an_object` CHECK (json_type(`setting_values`) = 'OBJECT'),
  CONSTRAINT `policies_rule_set_is_known` CHECK (`rule_set` in ('adults','children')),
  CONSTRAINT `policies_are_reviewed_by_another` CHECK (`reviewer_id` is null or `reviewer_id` <> `created_by`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `policy_drafts` (
  `id` uuid NOT NULL,
  `ward_id` uuid NOT NULL,
  `rule_set` varchar(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `rev` int(10) unsigned NOT NULL COMMENT 'raised with every save: a form that saw another one is told',
  `setting_values` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`setting_values`)),
  `changed_by` uuid NOT NULL,
  `changed_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  PRIMARY KEY (`id`),
  UNIQUE KEY `policy_drafts_of_ward` (`ward_id`,`rule_set`),
  KEY `policy_drafts_changed_by` (`changed_by`),
  CONSTRAINT `policy_drafts_changed_by` FOREIGN KEY (`changed_by`) REFERENCES `users` (`id`),
  CONSTRAINT `policy_drafts_ward` FOREIGN KEY (`ward_id`) REFERENCES `wards` (`id`),
  CONSTRAINT `policy_drafts_rule_set_is_known` CHECK (`rule_set` in ('adults','children')),
  CONSTRAINT `policy_drafts_values_are_an_object` CHECK (json_type(`setting_values`) = 'OBJECT')
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `policy_withdrawals` (
  `policy_id` uuid NOT NULL,
  `reason` varchar(500) NOT NULL,
  `withdrawn_by` uuid NOT NULL,
  `withdrawn_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  PRIMARY KEY (`policy_id`),
  KEY `policy_withdrawals_by` (`withdrawn_by`),
  CONSTRAINT `policy_withdrawals_by` FOREIGN KEY (`withdrawn_by`) REFERENCES `users` (`id`),
  CONSTRAINT `policy_withdrawals_policy` FOREIGN KEY (`policy_id`) REFERENCES `policies` (`id`),
  CONSTRAINT `policy_withdrawals_have_a_reason` CHECK (char_length(trim(`reason`)) > 0)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `record_changes` (
  `id` bigint(20) unsigned NOT NULL AUTO_INCREMENT,
  `subject` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `subject_id` uuid NOT NULL,
  `what` varchar(64) NOT NULL COMMENT 'in words: discharged, bed changed',
  `changed_by` uuid NOT NULL,
  `changed_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  `old_values` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin DEFAULT NULL COMMENT 'only what changed; null: it is new' CHECK (json_valid(`old_values`)),
  `new_values` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL CHECK (json_valid(`new_values`)),
  PRIMARY KEY (`id`),
  KEY `record_changes_of_subject` (`subject_id`,`id`),
  KEY `record_changes_changed_by` (`changed_by`),
  CONSTRAINT `record_changes_changed_by` FOREIGN KEY (`changed_by`) REFERENCES `users` (`id`),
  CONSTRAINT `record_changes_subject_is_known` CHECK (`subject` in ('patient','stay','ward','bed'))
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `schema_migrations` (
  `name` varchar(255) NOT NULL,
  PRIMARY KEY (`name`),
  UNIQUE KEY `name` (`name`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb3 COLLATE=utf8mb3_unicode_ci;

CREATE TABLE `sessions` (
  `id_hash` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `user_id` uuid NOT NULL,
  `started_at` datetime(3) NOT NULL,
  `seen_at` datetime(3) NOT NULL COMMENT 'the last thing a person did, to the minute; polls do not count',
  `ends_at` datetime(3) NOT NULL COMMENT 'the absolute end, whatever is done',
  `ended_at` datetime(3) DEFAULT NULL COMMENT 'null: not ended by anybody, which says nothing about its limits',
  `ended_because` varchar(32) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `address` varchar(45) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `user_agent` varchar(200) DEFAULT NULL,
  PRIMARY KEY (`id_hash`),
  KEY `sessions_of_user` (`user_id`,`ended_at`),
  KEY `sessions_by_end` (`ends_at`),
  CONSTRAINT `sessions_user` FOREIGN KEY (`user_id`) REFERENCES `users` (`id`),
  CONSTRAINT `sessions_end_for_a_reason` CHECK (`ended_at` is null = (`ended_because` is null))
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `sign_in_attempts` (
  `subject` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'SHA-256 of an account, an address, or both',
  `misses` int(10) unsigned NOT NULL,
  `last_missed_at` datetime(3) NOT NULL,
  PRIMARY KEY (`subject`),
  KEY `sign_in_attempts_by_age` (`last_missed_at`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `stays` (
  `id` uuid NOT NULL,
  `patient_id` uuid NOT NULL,
  `ward_id` uuid NOT NULL,
  `bed_id` uuid NOT NULL COMMENT 'the last bed, once discharged',
  `admitted_at` datetime(3) NOT NULL,
  `discharged_at` datetime(3) DEFAULT NULL,
  `discharge_reason` varchar(32) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `discharge_note` varchar(500) DEFAULT NULL,
  `entry_count` int(10) unsigned NOT NULL DEFAULT 0 COMMENT 'the number of its last entry; set by a trigger of entries',
  `last_entry_hash` char(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT '' COMMENT 'likewise',
  `occupied_bed_id` uuid GENERATED ALWAYS AS (if(`discharged_at` is null,`bed_id`,NULL)) VIRTUAL,
  `open_patient_id` uuid GENERATED ALWAYS AS (if(`discharged_at` is null,`patient_id`,NULL)) VIRTUAL,
  `countersign_count` int(10) unsigned NOT NULL DEFAULT 0 COMMENT 'raised by trigger, so that open pages notice',
  PRIMARY KEY (`id`),
  UNIQUE KEY `stays_one_to_a_bed` (`occupied_bed_id`),
  UNIQUE KEY `stays_one_to_a_patient` (`open_patient_id`),
  KEY `stays_of_ward` (`ward_id`,`discharged_at`),
  KEY `stays_of_patient` (`patient_id`,`admitted_at`),
  KEY `stays_bed_of_ward` (`bed_id`,`ward_id`),
  CONSTRAINT `stays_bed_of_ward` FOREIGN KEY (`bed_id`, `ward_id`) REFERENCES `beds` (`id`, `ward_id`),
  CONSTRAINT `stays_patient` FOREIGN KEY (`patient_id`) REFERENCES `patients` (`id`),
  CONSTRAINT `stays_ward` FOREIGN KEY (`ward_id`) REFERENCES `wards` (`id`),
  CONSTRAINT `stays_end_with_a_reason` CHECK (`discharged_at` is null = (`discharge_reason` is null)),
  CONSTRAINT `stays_end_after_they_start` CHECK (`discharged_at` is null or `discharged_at` >= `admitted_at`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `stock_moves` (
  `act_id` uuid NOT NULL COMMENT 'minted when the form was opened, or the entry: the same id twice is the same act',
  `part` tinyint(3) unsigned NOT NULL COMMENT 'an act may move several things, or one from place to place',
  `act` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `ward_id` uuid NOT NULL,
  `bed_id` uuid DEFAULT NULL COMMENT 'null: the store of the ward',
  `supply` varchar(32) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL COMMENT 'by name, as the program lists them',
  `tube_id` uuid DEFAULT NULL,
  `inner_cannula_id` uuid DEFAULT NULL,
  `item` varchar(36) CHARACTER SET ascii COLLATE ascii_bin GENERATED ALWAYS AS (coalesce(convert(`supply` using utf8mb4),cast(`tube_id` as char(36) charset utf8mb4),cast(`inner_cannula_id` as char(36) charset utf8mb4))) STORED,
  `quantity` int(11) NOT NULL COMMENT 'pieces; negative: they left the place',
  `counted` int(10) unsigned DEFAULT NULL COMMENT 'what lay there by a count; quantity is the difference',
  `entry_id` uuid DEFAULT NULL COMMENT 'whose use it is; of a give-back: the entry that no longer counts',
  `stay_id` uuid DEFAULT NULL COMMENT 'whose patient used it',
  `moved_at` datetime(3) NOT NULL COMMENT 'when it was done; of a use: when the care was',
  `recorded_at` datetime(3) NOT NULL DEFAULT utc_timestamp(3),
  `recorded_by` uuid NOT NULL,
  `reason` varchar(500) DEFAULT NULL,
  PRIMARY KEY (`act_id`,`part`),
  KEY `stock_moves_of_place` (`ward_id`,`item`,`bed_id`,`quantity`),
  KEY `stock_moves_of_bed` (`bed_id`,`item`,`quantity`),
  KEY `stock_moves_of_ward` (`ward_id`,`recorded_at`,`act_id`,`part`),
  KEY `stock_moves_of_use` (`stay_id`,`moved_at`,`item`,`quantity`),
  KEY `stock_moves_of_entry` (`entry_id`),
  KEY `stock_moves_bed` (`bed_id`,`ward_id`),
  KEY `stock_moves_tube` (`tube_id`),
  KEY `stock_moves_inner_cannula` (`inner_cannula_id`),
  KEY `stock_moves_recorded_by` (`recorded_by`),
  CONSTRAINT `stock_moves_bed` FOREIGN KEY (`bed_id`, `ward_id`) REFERENCES `beds` (`id`, `ward_id`),
  CONSTRAINT `stock_moves_entry` FOREIGN KEY (`entry_id`) REFERENCES `entries` (`id`),
  CONSTRAINT `stock_moves_inner_cannula` FOREIGN KEY (`inner_cannula_id`) REFERENCES `inner_cannulas` (`id`),
  CONSTRAINT `stock_moves_recorded_by` FOREIGN KEY (`recorded_by`) REFERENCES `users` (`id`),
  CONSTRAINT `stock_moves_stay` FOREIGN KEY (`stay_id`) REFERENCES `stays` (`id`),
  CONSTRAINT `stock_moves_tube` FOREIGN KEY (`tube_id`) REFERENCES `tubes` (`id`),
  CONSTRAINT `stock_moves_ward` FOREIGN KEY (`ward_id`) REFERENCES `wards` (`id`),
  CONSTRAINT `stock_moves_are_of_one_item` CHECK ((`supply` is not null) + (`tube_id` is not null) + (`inner_cannula_id` is not null) = 1),
  CONSTRAINT `stock_moves_act_is_known` CHECK (`act` in ('received','moved','used','given back','counted','wasted')),
  CONSTRAINT `stock_moves_go_one_way` CHECK (`act` = 'received' and `quantity` > 0 or `act` = 'moved' and `quantity` <> 0 or `act` in ('used','wasted') and `quantity` < 0 or `act` = 'given back' and `quantity` > 0 or `act` = 'counted'),
  CONSTRAINT `stock_moves_count_what_they_found` CHECK (`act` = 'counted' = (`counted` is not null)),
  CONSTRAINT `stock_moves_of_care_name_it` CHECK (`act` in ('used','given back') = (`entry_id` is not null) and `entry_id` is null = (`stay_id` is null)),
  CONSTRAINT `stock_moves_waste_with_a_reason` CHECK (`act` <> 'wasted' or `reason` is not null and char_length(trim(`reason`)) > 0),
  CONSTRAINT `stock_moves_have_happened` CHECK (`moved_at` <= `recorded_at` + interval 2 minute)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `tubes` (
  `id` uuid NOT NULL,
  `line_id` uuid NOT NULL,
  `size` varchar(12) NOT NULL COMMENT 'as on the label',
  `size_system` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `construction` varchar(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `inner_cannula` varchar(16) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL COMMENT 'null: single cannula',
  `id_with_inner` decimal(4,1) DEFAULT NULL COMMENT 'mm; null: single cannula',
  `id_without_inner` decimal(4,1) NOT NULL COMMENT 'mm',
  `od` decimal(4,1) NOT NULL COMMENT 'mm',
  `length_mm` decimal(4,1) NOT NULL,
  `cuff` varchar(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `fenestrated` tinyint(1) NOT NULL,
  `connector` varchar(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL COMMENT 'where the 15 mm connector sits',
  `flange` varchar(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `longest_use_days` smallint(5) unsigned DEFAULT NULL COMMENT 'null: the label gives none',
  `gtin` char(14) CHARACTER SET ascii COLLATE ascii_bin DEFAULT NULL,
  `insertion_aid` tinyint(1) NOT NULL COMMENT 'an obturator comes with it',
  `reusable_inner_cannulas` tinyint(3) unsigned NOT NULL COMMENT 'how many come with it',
  `retired_at` datetime(3) DEFAULT NULL,
  `version` int(10) unsigned NOT NULL DEFAULT 1 COMMENT 'raised by each edit, so that two at once are noticed',
  `sold_with` varchar(16) CHARACTER SET ascii COLLATE ascii_bin GENERATED ALWAYS AS (coalesce(`inner_cannula`,'none')) VIRTUAL,
  PRIMARY KEY (`id`),
  UNIQUE KEY `tubes_gtin` (`gtin`),
  UNIQUE KEY `tubes_described` (`line_id`,`size`,`size_system`,`construction`,`sold_with`,`cuff`,`fenestrated`,`connector`,`flange`,`length_mm`),
  KEY `tubes_by_size` (`size_system`,`size`),
  CONSTRAINT `tubes_line` FOREIGN KEY (`line_id`) REFERENCES `tube_lines` (`id`),
  CONSTRAINT `tubes_have_a_size` CHECK (char_length(trim(`size`)) > 0),
  CONSTRAINT `tubes_size_system_is_known` CHECK (`size_system` in ('ISO 5366','Jackson')),
  CONSTRAINT `tubes_are_single_or_dual` CHECK (`construction` = 'single' and `inner_cannula` is null and `id_with_inner` is null or `construction` = 'dual' and `inner_cannula` is not null and `inner_cannula` in ('disposable','reusable') and `id_with_inner` is not null),
  CONSTRAINT `tubes_walls_nest` CHECK (`od` > `id_without_inner` and (`id_with_inner` is null or `id_with_inner` > 0 and `id_without_inner` > `id_with_inner`)),
  CONSTRAINT `tubes_have_a_length` CHECK (`length_mm` > 0),
  CONSTRAINT `tubes_cuff_is_known` CHECK (`cuff` in ('none','air','water','foam')),
  CONSTRAINT `tubes_connector_is_known` CHECK (`connector` in ('outer','inner','none')),
  CONSTRAINT `tubes_flange_is_known` CHECK (`flange` in ('fixed','adjustable')),
  CONSTRAINT `tubes_last_a_day` CHECK (`longest_use_days` is null or `longest_use_days` > 0),
  CONSTRAINT `tubes_gtin_is_digits` CHECK (`gtin` is null or `gtin` regexp '^[0-9]{14}$')
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `tube_lines` (
  `id` uuid NOT NULL,
  `name` varchar(80) NOT NULL COMMENT 'as printed on the flange',
  `maker` varchar(80) NOT NULL,
  `former_names` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL DEFAULT '[]' COMMENT 'oldest first: what was charted and recalled under them is of this line' CHECK (json_valid(`former_names`)),
  PRIMARY KEY (`id`),
  UNIQUE KEY `tube_lines_name` (`name`),
  CONSTRAINT `tube_lines_are_named` CHECK (char_length(trim(`name`)) > 0 and char_length(trim(`maker`)) > 0)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `users` (
  `id` uuid NOT NULL,
  `name` varchar(120) NOT NULL,
  `email` varchar(254) CHARACTER SET utf8mb4 COLLATE utf8mb4_uca1400_as_ci NOT NULL,
  `role` varchar(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `supervised` tinyint(1) NOT NULL DEFAULT 0 COMMENT 'what they chart waits for a countersignature',
  `password_hash` varchar(200) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `password_set_at` datetime(3) NOT NULL,
  `one_time_until` datetime(3) DEFAULT NULL COMMENT 'the password works once, until then; null: it is the person''s own',
  `added_at` datetime(3) NOT NULL,
  `added_by` uuid DEFAULT NULL,
  `disabled_at` datetime(3) DEFAULT NULL,
  PRIMARY KEY (`id`),
  UNIQUE KEY `users_email` (`email`),
  KEY `users_added_by` (`added_by`),
  CONSTRAINT `users_added_by` FOREIGN KEY (`added_by`) REFERENCES `users` (`id`),
  CONSTRAINT `users_role_is_known` CHECK (`role` in ('nurse','respiratory therapist','charge nurse','tracheostomy specialist','educator','administrator','observer')),
  CONSTRAINT `users_are_named` CHECK (char_length(trim(`name`)) > 0)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `wards` (
  `id` uuid NOT NULL,
  `name` varchar(80) NOT NULL,
  `shift_times` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL COMMENT 'starts in local time, in order: ["07:00","15:00","23:00"]' CHECK (json_valid(`shift_times`)),
  `pressure_unit` varchar(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  `retired` tinyint(1) NOT NULL DEFAULT 0,
  `emergency_numbers` longtext CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL DEFAULT '[]' COMMENT 'whom to call, as printed on bed-head signs' CHECK (json_valid(`emergency_numbers`)),
  PRIMARY KEY (`id`),
  UNIQUE KEY `wards_name` (`name`),
  CONSTRAINT `wards_are_named` CHECK (char_length(trim(`name`)) > 0),
  CONSTRAINT `wards_pressure_unit_is_known` CHECK (`pressure_unit` in ('cmH2O','mmHg','kPa')),
  CONSTRAINT `wards_have_shifts` CHECK (json_type(`shift_times`) = 'ARRAY' and json_length(`shift_times`) > 0)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `ward_members` (
  `user_id` uuid NOT NULL,
  `ward_id` uuid NOT NULL,
  `added_at` datetime(3) NOT NULL,
  `added_by` uuid DEFAULT NULL,
  PRIMARY KEY (`user_id`,`ward_id`),
  KEY `ward_members_of_ward` (`ward_id`),
  KEY `ward_members_added_by` (`added_by`),
  CONSTRAINT `ward_members_added_by` FOREIGN KEY (`added_by`) REFERENCES `users` (`id`),
  CONSTRAINT `ward_members_user` FOREIGN KEY (`user_id`) REFERENCES `users` (`id`),
  CONSTRAINT `ward_members_ward` FOREIGN KEY (`ward_id`) REFERENCES `wards` (`id`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TABLE `ward_revs` (
  `ward_id` uuid NOT NULL,
  `rev` bigint(20) unsigned NOT NULL DEFAULT 1,
  PRIMARY KEY (`ward_id`),
  CONSTRAINT `ward_revs_ward` FOREIGN KEY (`ward_id`) REFERENCES `wards` (`id`)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_uca1400_ai_ci;

CREATE TRIGGER IF NOT EXISTS access_grants_refuse_delete BEFORE DELETE ON access_grants FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'access_grants is append-only';

CREATE TRIGGER IF NOT EXISTS access_grants_refuse_update BEFORE UPDATE ON access_grants FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'access_grants is append-only';

CREATE TRIGGER IF NOT EXISTS access_log_refuses_delete BEFORE DELETE ON access_log FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'access_log is append-only';

CREATE TRIGGER IF NOT EXISTS access_log_refuses_update BEFORE UPDATE ON access_log FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'access_log is append-only';

CREATE TRIGGER IF NOT EXISTS catalogue_changes_refuse_delete BEFORE DELETE ON catalogue_changes
    FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'catalogue_changes is append-only';

CREATE TRIGGER IF NOT EXISTS catalogue_changes_refuse_update BEFORE UPDATE ON catalogue_changes
    FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'catalogue_changes is append-only';

CREATE TRIGGER IF NOT EXISTS competences_refuse_delete BEFORE DELETE ON competences FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'competences is append-only: sign off anew, or withdraw';

CREATE TRIGGER IF NOT EXISTS competences_refuse_update BEFORE UPDATE ON competences FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'competences is append-only: sign off anew, or withdraw';

CREATE TRIGGER IF NOT EXISTS competence_withdrawals_refuse_delete BEFORE DELETE ON competence_withdrawals FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'competence_withdrawals is append-only: sign off anew, or withdraw';

CREATE TRIGGER IF NOT EXISTS competence_withdrawals_refuse_update BEFORE UPDATE ON competence_withdrawals FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'competence_withdrawals is append-only: sign off anew, or withdraw';

CREATE TRIGGER IF NOT EXISTS countersignatures_are_bound BEFORE INSERT ON countersignatures FOR EACH ROW
BEGIN
  DECLARE author, stay UUID;
  DECLARE supervised BOOLEAN;
  DECLARE stands VARCHAR(16) CHARACTER SET ascii;
  DECLARE head CHAR(64) CHARACTER SET ascii;
  SELECT recorded_by, stay_id, under_supervision, status, hash INTO author, stay, supervised, stands, head
    FROM entries WHERE id = NEW.entry_id;
  UPDATE stays SET countersign_count = countersign_count + 1 WHERE id = stay;
  IF NEW.signed_by = author OR RIGHT(NEW.signed_role, 18) = ' under supervision' THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'countersignatures are by a registered colleague of the author';
  END IF;
  IF NOT (supervised <=> TRUE) OR stands <> 'final' THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'countersignatures are of entries charted under supervision';
  END IF;
  IF EXISTS (SELECT 1 FROM entries WHERE supersedes_id = NEW.entry_id LOCK IN SHARE MODE) THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'countersignatures are of entries that count';
  END IF;
  SET NEW.hash = SHA2(CONCAT_WS('\n', head, NEW.entry_id, NEW.signed_by, NEW.signed_role, NEW.signed_at), 256);
END;

CREATE TRIGGER IF NOT EXISTS countersignatures_raise_the_ward AFTER INSERT ON countersignatures FOR EACH ROW
  INSERT INTO ward_revs (ward_id)
    SELECT s.ward_id FROM entries e JOIN stays s ON s.id = e.stay_id WHERE e.id = NEW.entry_id
    ON DUPLICATE KEY UPDATE rev = rev + 1;

CREATE TRIGGER IF NOT EXISTS countersignatures_refuse_delete BEFORE DELETE ON countersignatures FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'countersignatures is append-only';

CREATE TRIGGER IF NOT EXISTS countersignatures_refuse_update BEFORE UPDATE ON countersignatures FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'countersignatures is append-only';

CREATE TRIGGER IF NOT EXISTS entries_are_numbered BEFORE INSERT ON entries FOR EACH ROW
BEGIN
  DECLARE counted INT UNSIGNED;
  DECLARE ended DATETIME(3);
  DECLARE head CHAR(64) CHARACTER SET ascii;
  SELECT entry_count + 1, discharged_at, last_entry_hash INTO counted, ended, head
    FROM stays WHERE id = NEW.stay_id FOR UPDATE;
  IF counted IS NULL THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'entries belong to a stay';
  END IF;
  IF NEW.performed_at > ended THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'entries are performed within their stay';
  END IF;
  IF NEW.supersedes_id IS NOT NULL AND NOT EXISTS (SELECT 1 FROM entries
    WHERE id = NEW.supersedes_id AND stay_id = NEW.stay_id AND kind = NEW.kind LOCK IN SHARE MODE) THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'entries supersede one of the same stay and kind';
  END IF;
  SET NEW.number = counted, NEW.hash = SHA2(CONCAT_WS('\n', head, NEW.id, NEW.stay_id, counted, NEW.kind, NEW.version, NEW.performed_at,
    NEW.recorded_at, NEW.recorded_by, NEW.recorded_role, COALESCE(CAST(NEW.witness_id AS CHAR), '-'),
    COALESCE(CAST(NEW.supersedes_id AS CHAR), '-'), NEW.status, COALESCE(JSON_QUOTE(NEW.reason), '-'), NEW.data), 256);
  UPDATE stays SET entry_count = counted, last_entry_hash = NEW.hash WHERE id = NEW.stay_id;
END;

CREATE TRIGGER IF NOT EXISTS entries_raise_the_ward AFTER INSERT ON entries FOR EACH ROW
  INSERT INTO ward_revs (ward_id) SELECT ward_id FROM stays WHERE id = NEW.stay_id FOR UPDATE
    ON DUPLICATE KEY UPDATE rev = rev + 1;

CREATE TRIGGER IF NOT EXISTS entries_refuse_delete BEFORE DELETE ON entries FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'entries is append-only: correct or retract with a new entry';

CREATE TRIGGER IF NOT EXISTS entries_refuse_update BEFORE UPDATE ON entries FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'entries is append-only: correct or retract with a new entry';

CREATE TRIGGER IF NOT EXISTS entry_signatures_are_bound BEFORE INSERT ON entry_signatures FOR EACH ROW
BEGIN
  DECLARE author, witness UUID;
  DECLARE head CHAR(64) CHARACTER SET ascii;
  SELECT recorded_by, witness_id, hash INTO author, witness, head FROM entries WHERE id = NEW.entry_id;
  IF NOT (NEW.user_id <=> IF(NEW.part = 'author', author, witness)) THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'a signature is that of the author or the second person of its entry';
  END IF;
  SET NEW.hash = SHA2(CONCAT_WS('\n', head, NEW.entry_id, NEW.part, NEW.user_id, NEW.role, NEW.proof,
    COALESCE(NEW.competence, '-'), NEW.signed_at), 256);
END;

CREATE TRIGGER IF NOT EXISTS entry_signatures_refuse_delete BEFORE DELETE ON entry_signatures FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'entry_signatures is append-only';

CREATE TRIGGER IF NOT EXISTS entry_signatures_refuse_update BEFORE UPDATE ON entry_signatures FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'entry_signatures is append-only';

CREATE TRIGGER IF NOT EXISTS lot_recalls_refuse_delete BEFORE DELETE ON lot_recalls
    FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'lot_recalls is append-only';

CREATE TRIGGER IF NOT EXISTS lot_recalls_refuse_update BEFORE UPDATE ON lot_recalls
    FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'lot_recalls is append-only';

CREATE TRIGGER IF NOT EXISTS photographs_refuse_delete BEFORE DELETE ON photographs FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'photographs is append-only: correct or retract their entry';

CREATE TRIGGER IF NOT EXISTS photographs_refuse_update BEFORE UPDATE ON photographs FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'photographs is append-only: correct or retract their entry';

CREATE TRIGGER IF NOT EXISTS policies_refuse_delete BEFORE DELETE ON policies FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'policies is append-only: a change is a new version';

CREATE TRIGGER IF NOT EXISTS policies_refuse_update BEFORE UPDATE ON policies FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'policies is append-only: a change is a new version';

CREATE TRIGGER IF NOT EXISTS policy_withdrawals_come_early BEFORE INSERT ON policy_withdrawals FOR EACH ROW
  IF (SELECT starts_at FROM policies WHERE id = NEW.policy_id) <= UTC_TIMESTAMP(3) THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'this policy has started: it cannot be withdrawn';
  END IF;

CREATE TRIGGER IF NOT EXISTS policy_withdrawals_refuse_delete BEFORE DELETE ON policy_withdrawals FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'policy_withdrawals is append-only';

CREATE TRIGGER IF NOT EXISTS policy_withdrawals_refuse_update BEFORE UPDATE ON policy_withdrawals FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'policy_withdrawals is append-only';

CREATE TRIGGER IF NOT EXISTS record_changes_refuse_delete BEFORE DELETE ON record_changes FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'record_changes is append-only';

CREATE TRIGGER IF NOT EXISTS record_changes_refuse_update BEFORE UPDATE ON record_changes FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'record_changes is append-only';

CREATE TRIGGER IF NOT EXISTS stock_moves_refuse_delete BEFORE DELETE ON stock_moves FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'stock_moves is append-only: count, or give back with a new move';

CREATE TRIGGER IF NOT EXISTS stock_moves_refuse_update BEFORE UPDATE ON stock_moves FOR EACH ROW
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'stock_moves is append-only: count, or give back with a new move';
