import { sql, type Kysely, type Migration } from 'kysely';

/** Accounts, households, photos and scenes. Secrets from mailed links are kept only as SHA-256. */
export const foundation: Migration = {
  async up(db: Kysely<unknown>) {
    const id = sql`gen_random_uuid()`;
    const now = sql`now()`;

    await db.schema
      .createTable('account')
      .addColumn('id', 'uuid', (c) => c.primaryKey().defaultTo(id))
      .addColumn('email', 'text', (c) => c.notNull().unique())
      .addColumn('name', 'text', (c) => c.notNull())
      .addColumn('password_hash', 'text', (c) => c.notNull())
      .addColumn('created_at', 'timestamptz', (c) => c.notNull().defaultTo(now))
      .execute();

    await db.schema
      .createTable('session')
      .addColumn('sid', 'text', (c) => c.primaryKey())
      .addColumn('sess', 'jsonb', (c) => c.notNull())
      .addColumn('expire', 'timestamptz', (c) => c.notNull())
      .execute();
    await db.schema.createIndex('session_expire').on('session').column('expire').execute();
    await sql`create index session_account on session ((sess ->> 'accountId'))`.execute(db);

    await db.schema
      .createTable('household')
      .addColumn('id', 'uuid', (c) => c.primaryKey().defaultTo(id))
      .addColumn('name', 'text', (c) => c.notNull())
      .addColumn('created_at', 'timestamptz', (c) => c.notNull().defaultTo(now))
      .execute();
    await db.schema
      .createTable('membership')
      .addColumn('household_id', 'uuid', (c) => c.notNull().references('household.id').onDelete('cascade'))
      .addColumn('account_id', 'uuid', (c) => c.notNull().references('account.id').onDelete('cascade'))
      .addColumn('role', 'text', (c) => c.notNull().check(sql`role in ('owner', 'designer', 'tuner', 'viewer')`))
      .addColumn('joined_at', 'timestamptz', (c) => c.notNull().defaultTo(now))
      .addPrimaryKeyConstraint('membership_key', ['household_id', 'account_id'])
      .execute();
    await db.schema.createIndex('membership_account').on('membership').column('account_id').execute();

    await db.schema
      .createTable('sign_up')
      .addColumn('token_hash', 'bytea', (c) => c.primaryKey())
      .addColumn('email', 'text', (c) => c.notNull())
      .addColumn('expires_at', 'timestamptz', (c) => c.notNull())
      .execute();
    await db.schema
      .createTable('password_reset')
      .addColumn('token_hash', 'bytea', (c) => c.primaryKey())
      .addColumn('account_id', 'uuid', (c) => c.notNull().references('account.id').onDelete('cascade'))
      .addColumn('expires_at', 'timestamptz', (c) => c.notNull())
      .execute();
    await db.schema
      .createTable('invitation')
      .addColumn('id', 'uuid', (c) => c.primaryKey().defaultTo(id))
      .addColumn('token_hash', 'bytea', (c) => c.notNull().unique())
      .addColumn('household_id', 'uuid', (c) => c.notNull().references('household.id').onDelete('cascade'))
      .addColumn('email', 'text', (c) => c.notNull())
      .addColumn('role', 'text', (c) => c.notNull())
      .addColumn('invited_by', 'uuid', (c) => c.notNull().references('account.id').onDelete('cascade'))
      .addColumn('expires_at', 'timestamptz', (c) => c.notNull())
      .addUniqueConstraint('invitation_once', ['household_id', 'email'])
      .execute();

    await db.schema
      .createTable('photo')
      .addColumn('id', 'uuid', (c) => c.primaryKey().defaultTo(id))
      .addColumn('household_id', 'uuid', (c) => c.notNull().references('household.id').onDelete('cascade'))
      .addColumn('sha256', 'text', (c) => c.notNull())
      .addColumn('name', 'text', (c) => c.notNull())
      .addColumn('mime', 'text', (c) => c.notNull())
      .addColumn('bytes', 'bigint', (c) => c.notNull())
      .addColumn('width', 'integer', (c) => c.notNull())
      .addColumn('height', 'integer', (c) => c.notNull())
      .addColumn('has_alpha', 'boolean', (c) => c.notNull())
      .addColumn('taken_at', 'timestamptz', (c) => c.notNull())
      .addColumn('uploaded_at', 'timestamptz', (c) => c.notNull().defaultTo(now))
      .addColumn('uploaded_by', 'uuid', (c) => c.references('account.id').onDelete('set null'))
      .addColumn('state', 'text', (c) => c.notNull().defaultTo('waiting').check(sql`state in ('waiting', 'ready', 'failed')`))
      .addColumn('problem', 'text')
      .addColumn('placeholder', 'text')
      .addColumn('binned_at', 'timestamptz')
      .addUniqueConstraint('photo_once', ['household_id', 'sha256'])
      .execute();
    await sql`create index photo_by_date on photo (household_id, taken_at desc, id desc)`.execute(db);

    await db.schema
      .createTable('layer_image')
      .addColumn('id', 'uuid', (c) => c.primaryKey().defaultTo(id))
      .addColumn('household_id', 'uuid', (c) => c.notNull().references('household.id').onDelete('cascade'))
      .addColumn('sha256', 'text', (c) => c.notNull())
      .addColumn('width', 'integer', (c) => c.notNull())
      .addColumn('height', 'integer', (c) => c.notNull())
      .addColumn('trim', 'jsonb', (c) => c.notNull())
      .addColumn('created_at', 'timestamptz', (c) => c.notNull().defaultTo(now))
      .execute();
    await db.schema.createIndex('layer_image_household').on('layer_image').column('household_id').execute();

    await db.schema
      .createTable('scene')
      .addColumn('id', 'uuid', (c) => c.primaryKey().defaultTo(id))
      .addColumn('household_id', 'uuid', (c) => c.notNull().references('household.id').onDelete('cascade'))
      .addColumn('document', 'jsonb', (c) => c.notNull())
      .addColumn('revision', 'integer', (c) => c.notNull().defaultTo(1))
      .addColumn('saved_at', 'timestamptz', (c) => c.notNull().defaultTo(now))
      .addColumn('saved_by', 'uuid', (c) => c.references('account.id').onDelete('set null'))
      .addColumn('created_at', 'timestamptz', (c) => c.notNull().defaultTo(now))
      .addColumn('binned_at', 'timestamptz')
      .execute();
    await db.schema.createIndex('scene_household').on('scene').column('household_id').execute();
  },
};
