import type { Kysely, Migration } from 'kysely';

/** Since when no scene shows an image: it is kept for a while, for an undo in an open page can bring it back. */
export const unusedImages: Migration = {
  async up(db: Kysely<unknown>) {
    await db.schema.alterTable('layer_image').addColumn('unused_since', 'timestamptz').execute();
    await db.schema.createIndex('layer_image_content').on('layer_image').columns(['sha256']).execute();
    await db.schema.createIndex('photo_content').on('photo').columns(['sha256']).execute();
  },
};
