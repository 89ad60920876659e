import type { ColumnType, Generated, JSONColumnType } from 'kysely';
import type { Role } from '@oriel/shared/contracts/role';
import type { LayerImage, SceneDocument } from '@oriel/shared/contracts/scenes';
import type { ViewerScale } from '@oriel/shared/contracts/viewer-scales';
import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import type { WallReport } from '@oriel/shared/contracts/walls';
import type { CompactSample, RunFacts } from '../runs/compact-run';

type Moment = ColumnType<Date, Date | string, Date | string>;
type MomentByDefault = ColumnType<Date, Date | string | undefined, Date | string>;

export interface Tables {
  account: { id: Generated<string>; email: string; name: string; password_hash: string; created_at: MomentByDefault };
  session: { sid: string; sess: JSONColumnType<Record<string, unknown>>; expire: Moment };
  household: { id: Generated<string>; name: string; created_at: MomentByDefault };
  membership: { household_id: string; account_id: string; role: Role; joined_at: MomentByDefault };
  sign_up: { token_hash: Buffer; email: string; expires_at: Moment };
  password_reset: { token_hash: Buffer; account_id: string; expires_at: Moment };
  invitation: {
    id: Generated<string>;
    token_hash: Buffer;
    household_id: string;
    email: string;
    role: Role;
    invited_by: string;
    expires_at: Moment;
  };
  photo: {
    id: Generated<string>;
    household_id: string;
    sha256: string;
    name: string;
    mime: string;
    bytes: ColumnType<string, number, number>;
    width: number;
    height: number;
    has_alpha: boolean;
    taken_at: Moment;
    uploaded_at: MomentByDefault;
    uploaded_by: string | null;
    state: ColumnType<'waiting' | 'ready' | 'failed', 'waiting' | 'ready' | 'failed' | undefined>;
    problem: string | null;
    placeholder: string | null;
    binned_at: Moment | null;
  };
  layer_image: {
    id: Generated<string>;
    household_id: string;
    sha256: string;
    width: number;
    height: number;
    trim: JSONColumnType<LayerImage['trim']>;
    created_at: MomentByDefault;
    unused_since: Moment | null;
  };
  scene: {
    id: Generated<string>;
    household_id: string;
    document: JSONColumnType<SceneDocument>;
    revision: Generated<number>;
    saved_at: MomentByDefault;
    saved_by: string | null;
    created_at: MomentByDefault;
    binned_at: Moment | null;
  };
  wall: {
    id: Generated<string>;
    household_id: string;
    /** But for the scene, which the database itself keeps to what exists. */
    set_up: JSONColumnType<Omit<WallSetUp, 'sceneId'>>;
    scene_id: string | null;
    revision: Generated<number>;
    saved_at: MomentByDefault;
    saved_by: string | null;
    credential_hash: Buffer | null;
    paired_at: Moment | null;
    heard_at: Moment | null;
    report: JSONColumnType<WallReport> | null;
    created_at: MomentByDefault;
  };
  pairing: { code: string; claim_hash: Buffer; wall_id: string | null; expires_at: Moment };
  wall_report: { wall_id: string; at: Moment; report: JSONColumnType<WallReport>; received_at: MomentByDefault };
  viewer_scale: {
    id: Generated<string>;
    household_id: string;
    name: string;
    ipd_mm: JSONColumnType<ViewerScale['ipdMm']>;
    scale_factor: number;
    measured_at: MomentByDefault;
  };
  run: {
    id: Generated<string>;
    household_id: string;
    wall_id: string | null;
    name: string;
    facts: JSONColumnType<RunFacts>;
    samples: JSONColumnType<readonly CompactSample[]>;
    recorded_by: string | null;
    recorded_at: MomentByDefault;
  };
  tries: { key: Buffer; count: number; ends_at: Moment };
  milestone: { name: string; reached_at: MomentByDefault };
}
