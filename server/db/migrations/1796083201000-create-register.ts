import type { MigrationInterface, QueryRunner } from 'typeorm';

export class CreateRegister1796083201000 implements MigrationInterface {
  name = 'CreateRegister1796083201000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE \`machine\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`site_id\` int NOT NULL,
        \`tag\` varchar(40) NOT NULL,
        \`name\` varchar(120) NOT NULL,
        \`kind\` varchar(32) NOT NULL,
        \`drive\` varchar(120) NULL,
        \`power_kw\` double NULL,
        \`nominal_speed_rpm\` double NULL,
        \`speed_min_rpm\` double NULL,
        \`speed_max_rpm\` double NULL,
        \`line_frequency_hz\` double NULL,
        \`mounting\` varchar(16) NULL,
        \`blade_count\` int NULL,
        \`gear_teeth_count\` int NULL,
        \`belt_frequency_hz\` double NULL,
        \`criticality\` varchar(16) NOT NULL,
        \`next_planned_stop_on\` date NULL,
        \`notes\` text NULL,
        \`owner_user_id\` int NULL,
        \`version\` int NOT NULL DEFAULT '1',
        UNIQUE INDEX \`machine_site_tag\` (\`site_id\`, \`tag\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`bearing_position\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`machine_id\` int NOT NULL,
        \`code\` varchar(24) NOT NULL,
        \`name\` varchar(120) NOT NULL,
        \`kind\` varchar(16) NOT NULL,
        \`shaft_ratio\` double NOT NULL DEFAULT '1',
        \`designation\` varchar(24) NULL,
        \`bearing_type\` varchar(20) NULL,
        \`bore_mm\` double NULL,
        \`outside_mm\` double NULL,
        \`width_mm\` double NULL,
        \`bearing_class\` varchar(8) NULL,
        \`clearance_group\` varchar(4) NULL,
        \`inner_load\` varchar(16) NULL,
        \`outer_load\` varchar(16) NULL,
        \`load_level\` varchar(8) NULL,
        \`shaft_material\` varchar(16) NULL,
        \`housing_material\` varchar(16) NULL,
        \`split_housing\` tinyint NOT NULL DEFAULT 0,
        \`must_slide\` tinyint NOT NULL DEFAULT 0,
        \`shaft_c\` double NULL,
        \`inner_ring_c\` double NULL,
        \`outer_ring_c\` double NULL,
        \`housing_c\` double NULL,
        \`sequence\` int NOT NULL DEFAULT '0',
        UNIQUE INDEX \`bearing_position_machine_code\` (\`machine_id\`, \`code\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`fit_record\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`bearing_position_id\` int NOT NULL,
        \`seat\` varchar(8) NOT NULL,
        \`recorded_on\` date NOT NULL,
        \`source\` varchar(16) NOT NULL,
        \`tolerance_class\` varchar(8) NULL,
        \`seat_measured_mm\` double NULL,
        \`ring_measured_mm\` double NULL,
        \`condition\` varchar(32) NULL,
        \`note\` text NULL,
        \`inspection_id\` int NULL,
        \`recorded_by_user_id\` int NOT NULL,
        \`created_at\` datetime(3) NOT NULL,
        INDEX \`fit_record_position_seat_date\` (\`bearing_position_id\`, \`seat\`, \`recorded_on\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`measuring_point\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`bearing_position_id\` int NOT NULL,
        \`direction\` varchar(12) NOT NULL,
        UNIQUE INDEX \`measuring_point_position_direction\` (\`bearing_position_id\`, \`direction\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`route\` (
        \`id\` int NOT NULL AUTO_INCREMENT,
        \`site_id\` int NOT NULL,
        \`name\` varchar(120) NOT NULL,
        \`top_frequency_hz\` double NULL,
        \`line_count\` int NULL,
        \`version\` int NOT NULL DEFAULT '1',
        UNIQUE INDEX \`route_site_name\` (\`site_id\`, \`name\`),
        PRIMARY KEY (\`id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      CREATE TABLE \`route_point\` (
        \`route_id\` int NOT NULL,
        \`measuring_point_id\` int NOT NULL,
        \`sequence\` int NOT NULL,
        PRIMARY KEY (\`route_id\`, \`measuring_point_id\`)
      ) ENGINE=InnoDB
    `);
    await runner.query(`
      ALTER TABLE \`machine\` ADD CONSTRAINT \`FK_6214707b3d06dbdff02413ba576\` FOREIGN KEY (\`site_id\`) REFERENCES \`site\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`machine\` ADD CONSTRAINT \`FK_7aa55b87fadd58ae273cc823f11\` FOREIGN KEY (\`owner_user_id\`) REFERENCES \`user\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`bearing_position\` ADD CONSTRAINT \`FK_096ae38082840d4d3a8e05c5a5d\` FOREIGN KEY (\`machine_id\`) REFERENCES \`machine\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`fit_record\` ADD CONSTRAINT \`FK_09a8b058c6542e88fae835af808\` FOREIGN KEY (\`bearing_position_id\`) REFERENCES \`bearing_position\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`fit_record\` ADD CONSTRAINT \`FK_34847becf2acd0fdf7debc3ee05\` FOREIGN KEY (\`recorded_by_user_id\`) REFERENCES \`user\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`measuring_point\` ADD CONSTRAINT \`FK_f2f18a58c013155851da4581c9b\` FOREIGN KEY (\`bearing_position_id\`) REFERENCES \`bearing_position\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`route\` ADD CONSTRAINT \`FK_a677aa78e04bcb2fb2db3f02b36\` FOREIGN KEY (\`site_id\`) REFERENCES \`site\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`route_point\` ADD CONSTRAINT \`FK_67ab2d6931378142fd80b8a562e\` FOREIGN KEY (\`route_id\`) REFERENCES \`route\`(\`id\`) ON DELETE CASCADE ON UPDATE NO ACTION
    `);
    await runner.query(`
      ALTER TABLE \`route_point\` ADD CONSTRAINT \`FK_6080cb9a18fa12ace0fdc652351\` FOREIGN KEY (\`measuring_point_id\`) REFERENCES \`measuring_point\`(\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE `route_point`');
    await runner.query('DROP TABLE `route`');
    await runner.query('DROP TABLE `measuring_point`');
    await runner.query('DROP TABLE `fit_record`');
    await runner.query('DROP TABLE `bearing_position`');
    await runner.query('DROP TABLE `machine`');
  }
}
