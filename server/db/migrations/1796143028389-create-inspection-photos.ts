import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Photographs of an inspection. */
export class CreateInspectionPhotos1796143028389 implements MigrationInterface {
  name = 'CreateInspectionPhotos1796143028389';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE \`inspection_photo\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`inspection_id\` int NOT NULL,
        \`content_hash\` char(64) NOT NULL,
        \`file_name\` varchar(255) NOT NULL,
        \`width_px\` int NOT NULL,
        \`height_px\` int NOT NULL,
        \`added_by_user_id\` int NOT NULL,
        \`added_at\` datetime(3) NOT NULL,
        UNIQUE INDEX \`inspection_photo_content\` (\`inspection_id\`, \`content_hash\`),
        PRIMARY KEY (\`id\`),
        CONSTRAINT \`FK_da00e92c8e0c77b7782ef7cfc3e\` FOREIGN KEY (\`inspection_id\`) REFERENCES \`inspection\` (\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION,
        CONSTRAINT \`FK_23c334baae77febe20b1d5463c2\` FOREIGN KEY (\`added_by_user_id\`) REFERENCES \`user\` (\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
      ) ENGINE=InnoDB
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `inspection_photo`');
  }
}
