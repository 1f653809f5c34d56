import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateAccounts1796083200000 implements MigrationInterface {
  name = 'CreateAccounts1796083200000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE \`site\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`name\` varchar(120) NOT NULL,
        \`created_at\` datetime(3) NOT NULL,
        UNIQUE INDEX \`IDX_9669a09fcc0eb6d2794a658f64\` (\`name\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`user\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`email\` varchar(254) NOT NULL,
        \`name\` varchar(120) NOT NULL,
        \`password_hash\` varchar(255) NOT NULL,
        \`is_administrator\` tinyint NOT NULL DEFAULT 0,
        \`created_at\` datetime(3) NOT NULL,
        UNIQUE INDEX \`IDX_e12875dfb3b1d92d7d7c5377e2\` (\`email\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`membership\` (
        \`user_id\` int NOT NULL,
        \`site_id\` int NOT NULL,
        \`role\` varchar(16) NOT NULL,
        PRIMARY KEY (\`user_id\`, \`site_id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`refresh_token\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`user_id\` int NOT NULL,
        \`token_hash\` char(64) NOT NULL,
        \`family_id\` char(36) NOT NULL,
        \`expires_at\` datetime(3) NOT NULL,
        \`used_at\` datetime(3) NULL,
        \`revoked_at\` datetime(3) NULL,
        UNIQUE INDEX \`IDX_f0812282fad2e352cdaf83ef0a\` (\`token_hash\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`activity\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`site_id\` int NULL,
        \`user_id\` int NULL,
        \`action\` varchar(60) NOT NULL,
        \`object_type\` varchar(32) NOT NULL,
        \`object_id\` int NULL,
        \`details\` json NULL,
        \`happened_at\` datetime(3) NOT NULL,
        INDEX \`activity_site_time\` (\`site_id\`, \`happened_at\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      ALTER TABLE \`membership\` ADD CONSTRAINT \`FK_e9c72e8d29784031c96f5c6af8d\` FOREIGN KEY (\`user_id\`) REFERENCES \`user\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`membership\` ADD CONSTRAINT \`FK_758fd93b29d58559d2e82312dd3\` FOREIGN KEY (\`site_id\`) REFERENCES \`site\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`refresh_token\` ADD CONSTRAINT \`FK_6bbe63d2fe75e7f0ba1710351d4\` FOREIGN KEY (\`user_id\`) REFERENCES \`user\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `activity`');
    await runner.query('DROP TABLE `refresh_token`');
    await runner.query('DROP TABLE `membership`');
    await runner.query('DROP TABLE `user`');
    await runner.query('DROP TABLE `site`');
  }
}
