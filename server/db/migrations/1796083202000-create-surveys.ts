import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateSurveys1796083202000 implements MigrationInterface {
  name = 'CreateSurveys1796083202000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE \`survey\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`route_id\` int NOT NULL,
        \`surveyed_on\` date NOT NULL,
        \`created_by_user_id\` int NOT NULL,
        \`created_at\` datetime(3) NOT NULL,
        UNIQUE INDEX \`survey_route_date\` (\`route_id\`, \`surveyed_on\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`waveform\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`survey_id\` int NOT NULL,
        \`measuring_point_id\` int NOT NULL,
        \`content_hash\` char(64) NOT NULL,
        \`channel_index\` int NOT NULL DEFAULT '0',
        \`file_name\` varchar(255) NOT NULL,
        \`file_bytes\` int NOT NULL,
        \`quantity\` varchar(16) NOT NULL,
        \`unit\` varchar(8) NOT NULL,
        \`sample_rate_hz\` double NOT NULL,
        \`sample_count\` int NOT NULL,
        \`gap_count\` int NOT NULL DEFAULT '0',
        \`told_speed_rpm\` double NULL,
        \`full_scale\` double NULL,
        \`taken_at\` datetime(3) NULL,
        \`uploaded_at\` datetime(3) NOT NULL,
        \`uploaded_by_user_id\` int NOT NULL,
        \`screening_state\` varchar(12) NOT NULL,
        \`screening_run\` int NOT NULL DEFAULT '1',
        \`screening_attempts\` int NOT NULL DEFAULT '0',
        \`screening_failure\` text NULL,
        INDEX \`waveform_screening_state\` (\`screening_state\`),
        UNIQUE INDEX \`waveform_survey_content\` (\`survey_id\`, \`content_hash\`, \`channel_index\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`rejected_file\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`survey_id\` int NOT NULL,
        \`file_name\` varchar(255) NOT NULL,
        \`content_hash\` char(64) NOT NULL,
        \`error_code\` varchar(40) NOT NULL,
        \`error_line\` int NULL,
        \`error_message\` text NOT NULL,
        \`rejected_at\` datetime(3) NOT NULL,
        UNIQUE INDEX \`rejected_file_survey_content\` (\`survey_id\`, \`content_hash\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`screening\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`waveform_id\` int NOT NULL,
        \`run\` int NOT NULL,
        \`verdict\` varchar(12) NOT NULL,
        \`score\` double NULL,
        \`speed_hz\` double NULL,
        \`overall_mm_per_srms\` double NULL,
        \`method_version\` varchar(32) NOT NULL,
        \`result\` json NOT NULL,
        \`screened_at\` datetime(3) NOT NULL,
        \`decision\` varchar(12) NULL,
        \`decision_reason\` text NULL,
        \`decided_by_user_id\` int NULL,
        \`decided_at\` datetime(3) NULL,
        INDEX \`screening_queue\` (\`decision\`, \`verdict\`, \`score\`),
        UNIQUE INDEX \`screening_waveform_run\` (\`waveform_id\`, \`run\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      ALTER TABLE \`survey\` ADD CONSTRAINT \`FK_b510545f4fedfc7e8133576c17a\` FOREIGN KEY (\`route_id\`) REFERENCES \`route\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`survey\` ADD CONSTRAINT \`FK_a84c659047c52807136d8b827fb\` FOREIGN KEY (\`created_by_user_id\`) REFERENCES \`user\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`waveform\` ADD CONSTRAINT \`FK_0b2e7a38780485a1c49b40cfa47\` FOREIGN KEY (\`survey_id\`) REFERENCES \`survey\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`waveform\` ADD CONSTRAINT \`FK_ed6b35933f1d6d3895d95466898\` FOREIGN KEY (\`measuring_point_id\`) REFERENCES \`measuring_point\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`rejected_file\` ADD CONSTRAINT \`FK_933e69c84e60139d895394c1127\` FOREIGN KEY (\`survey_id\`) REFERENCES \`survey\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`screening\` ADD CONSTRAINT \`FK_a078876234466887abc6eaff231\` FOREIGN KEY (\`waveform_id\`) REFERENCES \`waveform\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`screening\` ADD CONSTRAINT \`FK_a27907b192fc097a581e742ced8\` FOREIGN KEY (\`decided_by_user_id\`) REFERENCES \`user\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `screening`');
    await runner.query('DROP TABLE `rejected_file`');
    await runner.query('DROP TABLE `waveform`');
    await runner.query('DROP TABLE `survey`');
  }
}
