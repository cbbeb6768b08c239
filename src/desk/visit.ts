import type { Role, Settings, ShopChange, ShopPerson } from '../shop/index.ts';
import type { Directory } from './call.ts';

/** A shop that keeps records, opened for one change by whoever asks. */
export type Visit = {
  readonly shop: ShopChange;
  readonly person: ShopPerson;
  /** What they may, everything taken together. */
  readonly role: Role;
  readonly settings: Settings;
  /** The id with which a person comes in who is called so here. */
  readonly outsideId: (called: string) => string;
  /** Whom the platform knows, where it says so. */
  readonly directory: Directory | null;
};
