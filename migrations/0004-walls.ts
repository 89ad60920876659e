import { sql, type Kysely, type Migration } from 'kysely';

/** Walls, their pairing and reports; viewers' scales; the bench's runs. A wall's credential and a screen's claim are kept only as SHA-256. */
export const walls: Migration = {
  async up(db: Kysely<unknown>) {
    const id = sql`gen_random_uuid()`;
    const now = sql`now()`;

    await db.schema
      .createTable('wall')
      .addColumn('id', 'uuid', (c) => c.primaryKey().defaultTo(id))
      .addColumn('household_id', 'uuid', (c) => c.notNull().references('household.id').onDelete('cascade'))
      .addColumn('set_up', 'jsonb', (c) => c.notNull())
      .addColumn('scene_id', 'uuid', (c) => c.references('scene.id').onDelete('set null'))
      .addColumn('revision', 'integer', (c) => c.notNull().defaultTo(1))
      .addColumn('saved_at', 'timestamptz', (c) => c.notNull().defaultTo(now))
      .addColumn('saved_by', 'uuid', (c) => c.references('account.id').onDelete('set null'))
      .addColumn('credential_hash', 'bytea', (c) => c.unique())
      .addColumn('paired_at', 'timestamptz')
      .addColumn('heard_at', 'timestamptz')
      .addColumn('report', 'jsonb')
      .addColumn('created_at', 'timestamptz', (c) => c.notNull().defaultTo(now))
      .execute();
    await db.schema.createIndex('wall_household').on('wall').column('household_id').execute();
    await db.schema.createIndex('wall_scene').on('wall').column('scene_id').execute();

    await db.schema
      .createTable('pairing')
      .addColumn('code', 'text', (c) => c.primaryKey())
      .addColumn('claim_hash', 'bytea', (c) => c.notNull().unique())
      .addColumn('wall_id', 'uuid', (c) => c.references('wall.id').onDelete('cascade'))
      .addColumn('expires_at', 'timestamptz', (c) => c.notNull())
      .execute();
    await db.schema.createIndex('pairing_wall').on('pairing').column('wall_id').execute();

    await db.schema
      .createTable('wall_report')
      .addColumn('wall_id', 'uuid', (c) => c.notNull().references('wall.id').onDelete('cascade'))
      .addColumn('at', 'timestamptz', (c) => c.notNull())
      .addColumn('report', 'jsonb', (c) => c.notNull())
      .addColumn('received_at', 'timestamptz', (c) => c.notNull().defaultTo(now))
      .addPrimaryKeyConstraint('wall_report_key', ['wall_id', 'at'])
      .execute();
    await db.schema.createIndex('wall_report_received').on('wall_report').column('received_at').execute();

    await db.schema
      .createTable('viewer_scale')
      .addColumn('id', 'uuid', (c) => c.primaryKey().defaultTo(id))
      .addColumn('household_id', 'uuid', (c) => c.notNull().references('household.id').onDelete('cascade'))
      .addColumn('name', 'text', (c) => c.notNull())
      .addColumn('ipd_mm', 'jsonb', (c) => c.notNull())
      .addColumn('scale_factor', 'double precision', (c) => c.notNull())
      .addColumn('measured_at', 'timestamptz', (c) => c.notNull().defaultTo(now))
      .addUniqueConstraint('viewer_scale_once', ['household_id', 'name'])
      .execute();

    await db.schema
      .createTable('run')
      .addColumn('id', 'uuid', (c) => c.primaryKey().defaultTo(id))
      .addColumn('household_id', 'uuid', (c) => c.notNull().references('household.id').onDelete('cascade'))
      .addColumn('wall_id', 'uuid', (c) => c.references('wall.id').onDelete('set null'))
      .addColumn('name', 'text', (c) => c.notNull())
      .addColumn('facts', 'jsonb', (c) => c.notNull())
      .addColumn('samples', 'jsonb', (c) => c.notNull())
      .addColumn('recorded_by', 'uuid', (c) => c.references('account.id').onDelete('set null'))
      .addColumn('recorded_at', 'timestamptz', (c) => c.notNull().defaultTo(now))
      .execute();
    await sql`create index run_by_time on run (household_id, recorded_at desc)`.execute(db);
    await db.schema.createIndex('run_wall').on('run').column('wall_id').execute();
  },
};
