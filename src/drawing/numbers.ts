import type {
  Form,
  MaterialGroup,
  Mm,
  Pattern,
  Process,
  Rad,
  State,
  Support,
  Travel,
  Window,
} from '../calc/index.ts';

/** Section across the work: everything the tooth form is drawn from, lengths in millimetres. */
export type ToothFormNumbers = {
  readonly toothCount: number;
  readonly blankDiameter: Mm;
  /** Over the crests, as expected. */
  readonly crestDiameter: Mm;
  readonly toothHeight: Mm;
  readonly sharpHeight: Mm;
  readonly infeed: Mm;
  readonly pitch: Mm;
  readonly transversePitch: Mm;
  readonly crestFlat: Mm;
  readonly process: Process;
};

/** A diameter that is marked on the strip; that of a part is over its crests. */
export type StripMark = { readonly what: 'bar' | 'blank' | 'part'; readonly diameter: Mm };

export type TrackingStripNumbers = {
  readonly transversePitch: Mm;
  /** A diameter that holds a whole count which nobody has counted; null: the label's counts hold. */
  readonly wholeAt: Mm | null;
  /** Half width of the window round each whole count, on the diameter. */
  readonly below: Mm;
  readonly above: Mm;
  readonly marks: readonly StripMark[];
  /** What was expected over the crests of a part that is measured there. */
  readonly expected: Window | null;
  /** From a diameter that does not track to the next that does; what comes off, where that is known. */
  readonly next: { readonly from: Mm; readonly to: Mm; readonly off: Mm | null } | null;
};

export type SetupSketchNumbers = {
  readonly blankDiameter: Mm;
  readonly bore: Mm | null;
  readonly length: Mm;
  /** Null: not said. */
  readonly stickout: Mm | null;
  readonly chamfer: Mm;
  readonly wheelDiameter: Mm;
  readonly wheelFace: Mm;
  readonly support: Support;
  readonly opposed: boolean;
  readonly travel: Travel;
};

export type DevelopedPatternNumbers = {
  readonly toothCount: number;
  readonly transversePitch: Mm;
  readonly helix: Rad;
  readonly families: 'straight' | 'left' | 'right' | 'crossed' | 'square';
  /** Share of a tooth that the second turn is beside the first. */
  readonly toothError: number;
  /** The error is small enough for the second turn to fall into the first. */
  readonly tracks: boolean;
};

export type MapCandidate = {
  readonly blankDiameter: Mm;
  readonly fill: number;
  readonly toothCount: number;
  readonly state: State;
  /** The shop's name for the wheel, as it is. */
  readonly wheel: string;
};

export type PlanMapNumbers = {
  readonly limits: Window;
  /** The likeliest first; the first few are numbered. */
  readonly candidates: readonly MapCandidate[];
  /** The tooth that the limits are drawn for: that of the first candidate. */
  readonly tooth: {
    readonly form: Form;
    readonly sharpHeight: Mm;
    readonly growthMean: number;
    readonly process: Process;
  };
};

/** Measured growth of one part over what volume alone would give. */
export type Share = {
  readonly share: number;
  /** Not learned from until somebody confirms it. */
  readonly isDoubted: boolean;
};

/** What a shop has seen of one pattern in one family of materials. */
export type FamilyRecord = {
  readonly pattern: Pattern;
  readonly material: MaterialGroup;
  /** Parts that were learned from. */
  readonly parts: number;
  /** Share expected of the next part, and its 80 % interval. */
  readonly mean: number;
  readonly low: number;
  readonly high: number;
  /** One for each part that was measured. */
  readonly shares: readonly Share[];
};

export type ShopRecordNumbers = {
  /** Those that are shown first come first. */
  readonly families: readonly FamilyRecord[];
  /** What is expected before any result. */
  readonly prior: { readonly mean: number; readonly low: number; readonly high: number };
};

export type PictureNumbers = {
  readonly toothForm: ToothFormNumbers;
  readonly trackingStrip: TrackingStripNumbers;
  readonly setupSketch: SetupSketchNumbers;
  readonly developedPattern: DevelopedPatternNumbers;
  readonly planMap: PlanMapNumbers;
  readonly shopRecord: ShopRecordNumbers;
};
export type PictureKind = keyof PictureNumbers;
export type PictureOf<K extends PictureKind> = {
  readonly kind: K;
  readonly numbers: PictureNumbers[K];
};
/** A closed union: a new kind of picture needs a drawing, words and alt text before it compiles. */
export type Picture = { [K in PictureKind]: PictureOf<K> }[PictureKind];
