import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateFindings1796083203000 implements MigrationInterface {
  name = 'CreateFindings1796083203000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE \`finding\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`site_id\` int NOT NULL,
        \`bearing_position_id\` int NOT NULL,
        \`state\` varchar(12) NOT NULL,
        \`opened_at\` datetime(3) NOT NULL,
        \`version\` int NOT NULL DEFAULT '1',
        INDEX \`finding_site_state\` (\`site_id\`, \`state\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`finding_screening\` (
        \`finding_id\` int NOT NULL,
        \`screening_id\` int NOT NULL,
        PRIMARY KEY (\`finding_id\`, \`screening_id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`inspection\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`finding_id\` int NOT NULL,
        \`state\` varchar(12) NOT NULL,
        \`assignee_user_id\` int NOT NULL,
        \`assigned_by_user_id\` int NOT NULL,
        \`assigned_at\` datetime(3) NOT NULL,
        \`due_on\` date NOT NULL,
        \`check_shaft_seat\` tinyint NOT NULL,
        \`check_housing_seat\` tinyint NOT NULL,
        \`check_in_place\` tinyint NOT NULL,
        \`work_order_reference\` varchar(60) NULL,
        \`instructions\` text NULL,
        \`report\` json NULL,
        \`reported_at\` datetime(3) NULL,
        \`version\` int NOT NULL DEFAULT '1',
        INDEX \`inspection_assignee_state\` (\`assignee_user_id\`, \`state\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`state_change\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`finding_id\` int NOT NULL,
        \`inspection_id\` int NULL,
        \`from_state\` varchar(12) NULL,
        \`to_state\` varchar(12) NOT NULL,
        \`reason\` text NULL,
        \`changed_by_user_id\` int NOT NULL,
        \`changed_at\` datetime(3) NOT NULL,
        INDEX \`state_change_finding\` (\`finding_id\`, \`changed_at\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      ALTER TABLE \`finding\` ADD CONSTRAINT \`FK_05cdc95dcab164461f84bc82c58\` FOREIGN KEY (\`site_id\`) REFERENCES \`site\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`finding\` ADD CONSTRAINT \`FK_b6bbd7b33eb3433eba2ec33c1f5\` FOREIGN KEY (\`bearing_position_id\`) REFERENCES \`bearing_position\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`finding_screening\` ADD CONSTRAINT \`FK_7b47bfdd23c5af2bb404b86c1ac\` FOREIGN KEY (\`finding_id\`) REFERENCES \`finding\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`finding_screening\` ADD CONSTRAINT \`FK_cd64ce533c34355b1472038c255\` FOREIGN KEY (\`screening_id\`) REFERENCES \`screening\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`inspection\` ADD CONSTRAINT \`FK_8a5a31d52f66dd3a7ba987e2639\` FOREIGN KEY (\`finding_id\`) REFERENCES \`finding\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`inspection\` ADD CONSTRAINT \`FK_98bf59f06b7fc9b3cfc463cded5\` FOREIGN KEY (\`assignee_user_id\`) REFERENCES \`user\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`inspection\` ADD CONSTRAINT \`FK_ef63b2ea7a1edd368332d2762d4\` FOREIGN KEY (\`assigned_by_user_id\`) REFERENCES \`user\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`state_change\` ADD CONSTRAINT \`FK_1c7c7939ec24d7308249fc1edc7\` FOREIGN KEY (\`finding_id\`) REFERENCES \`finding\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`state_change\` ADD CONSTRAINT \`FK_baccf06bcc0b6b1dd910b8df7c9\` FOREIGN KEY (\`changed_by_user_id\`) REFERENCES \`user\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `state_change`');
    await runner.query('DROP TABLE `inspection`');
    await runner.query('DROP TABLE `finding_screening`');
    await runner.query('DROP TABLE `finding`');
  }
}
