import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Tapered and bonded seats, hollow shafts, thin housings, and the stage of an inspection's record. */
export class AddSeatDepth1796133730464 implements MigrationInterface {
  name = 'AddSeatDepth1796133730464';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      ALTER TABLE \`bearing_position\`
        ADD \`shaft_seat_form\` varchar(20) NOT NULL DEFAULT 'cylindrical',
        ADD \`seat_taper\` varchar(4) NULL,
        ADD \`shaft_bore_mm\` double NULL,
        ADD \`housing_wall_mm\` double NULL,
        ADD \`radial_load_n\` double NULL,
        ADD \`heat_through_shaft\` tinyint NOT NULL DEFAULT 0
    `);
    await runner.query(`
      ALTER TABLE \`fit_record\`
        ADD \`diameter_unit\` varchar(2) NOT NULL DEFAULT 'mm',
        ADD \`drive_up_mm\` double NULL,
        ADD \`clearance_reduction_um\` double NULL,
        ADD \`bonding\` varchar(12) NULL,
        ADD \`stage\` varchar(8) NULL
    `);
    // Until now the stage stood only at the head of the note that the report wrote itself.
    await runner.query(`
      UPDATE \`fit_record\`
         SET \`stage\` = IF(\`note\` LIKE 'As left;%', 'as left', 'as found')
       WHERE \`inspection_id\` IS NOT NULL
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`
      ALTER TABLE \`fit_record\`
        DROP \`stage\`, DROP \`bonding\`, DROP \`clearance_reduction_um\`,
        DROP \`drive_up_mm\`, DROP \`diameter_unit\`
    `);
    await runner.query(`
      ALTER TABLE \`bearing_position\`
        DROP \`heat_through_shaft\`, DROP \`radial_load_n\`, DROP \`housing_wall_mm\`,
        DROP \`shaft_bore_mm\`, DROP \`seat_taper\`, DROP \`shaft_seat_form\`
    `);
  }
}
