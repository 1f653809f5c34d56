import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateRegisterImports1796133109617 implements MigrationInterface {
  name = 'CreateRegisterImports1796133109617';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE \`register_import\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`site_id\` int NOT NULL,
        \`kind\` varchar(16) NOT NULL,
        \`state\` varchar(12) NOT NULL,
        \`file_name\` varchar(255) NOT NULL,
        \`encoding\` varchar(16) NOT NULL,
        \`separator\` varchar(12) NOT NULL,
        \`row_count\` int NOT NULL,
        \`new_count\` int NOT NULL DEFAULT '0',
        \`changed_count\` int NOT NULL DEFAULT '0',
        \`same_count\` int NOT NULL DEFAULT '0',
        \`wrong_count\` int NOT NULL DEFAULT '0',
        \`failure\` text NULL,
        \`uploaded_by_user_id\` int NOT NULL,
        \`uploaded_at\` datetime(3) NOT NULL,
        \`applied_by_user_id\` int NULL,
        \`applied_at\` datetime(3) NULL,
        \`undone_by_user_id\` int NULL,
        \`undone_at\` datetime(3) NULL,
        INDEX \`register_import_site\` (\`site_id\`, \`id\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`register_import_row\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`register_import_id\` int NOT NULL,
        \`row_number\` int NOT NULL,
        \`fate\` varchar(8) NOT NULL,
        \`label\` varchar(160) NOT NULL,
        \`faults\` json NULL,
        \`changes\` json NULL,
        \`plan\` json NULL,
        \`object_id\` int NULL,
        INDEX \`register_import_row_fate\` (\`register_import_id\`, \`fate\`, \`row_number\`),
        UNIQUE INDEX \`register_import_row_number\` (\`register_import_id\`, \`row_number\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      ALTER TABLE \`register_import\` ADD CONSTRAINT \`FK_27346ad81fbd64344399b3fa1ee\` FOREIGN KEY (\`site_id\`) REFERENCES \`site\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`register_import\` ADD CONSTRAINT \`FK_ae0eedd2123305c2902af8b0a28\` FOREIGN KEY (\`uploaded_by_user_id\`) REFERENCES \`user\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`register_import\` ADD CONSTRAINT \`FK_f589ceef686824f47812d861ead\` FOREIGN KEY (\`applied_by_user_id\`) REFERENCES \`user\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`register_import\` ADD CONSTRAINT \`FK_81462edb3a846ac41073b752e05\` FOREIGN KEY (\`undone_by_user_id\`) REFERENCES \`user\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`register_import_row\` ADD CONSTRAINT \`FK_42693c2f4d7e3ac3bd80f7559db\` FOREIGN KEY (\`register_import_id\`) REFERENCES \`register_import\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `register_import_row`');
    await runner.query('DROP TABLE `register_import`');
  }
}
