import type { CautionId, CheckName, CheckOf, State } from '../calc/index.ts';
import type { LabelId, Labels, LineId, Lines, RowId, Rows } from '../card/index.ts';
import type { Contradiction, Refusal } from '../refusal.ts';
import type { ChatPhrases, ConfigPhrases } from './chat.ts';
import type { DiscordPhrases } from './discord.ts';
import type { PicturePhrases } from './picturePhrases.ts';
import type { RecordsPhrases } from './records.ts';
import type { Show } from './show.ts';
import type { SlackPhrases } from './slack.ts';

/** A figure with its name in front. */
export type LabelledText = { readonly label: string; readonly text: string };

/** One phrase for each thing that can be said; a missing one does not compile. */
export type Book = {
  readonly language: string;
  readonly lines: { readonly [K in LineId]: (values: Lines[K], show: Show) => string };
  readonly rows: { readonly [K in RowId]: (values: Rows[K], show: Show) => LabelledText };
  readonly labels: { readonly [K in LabelId]: (values: Labels[K], show: Show) => string };
  readonly checks: {
    readonly [N in CheckName]: {
      readonly label: string;
      readonly say: (check: CheckOf<N>, show: Show) => string;
    };
  };
  readonly states: { readonly [S in State]: string };
  readonly cautions: { readonly [C in CautionId]: string };
  /** The standing cautions in one breath, on every set-up card. */
  readonly standing: string;
  readonly footing: string;
  readonly choices: string;
  readonly contradictions: { readonly [C in Contradiction]: string };
  readonly refusal: (refusal: Refusal, show: Show) => string;
  /** What a verb does, by its path: `knurl setup`. */
  readonly verbs: Readonly<Record<string, string>>;
  /** What a parameter is called, by its name. */
  readonly parameters: Readonly<Record<string, string>>;
  readonly chat: ChatPhrases;
  readonly discord: DiscordPhrases;
  readonly slack: SlackPhrases;
  readonly config: ConfigPhrases;
  readonly records: RecordsPhrases;
  readonly pictures: PicturePhrases;
  readonly terminal: TerminalPhrases;
};

/** What the local channel says around the cards. */
export type TerminalPhrases = {
  readonly opening: readonly string[];
  readonly prompt: string;
  /** Who speaks now, and where. */
  readonly speaks: (name: string, place: string) => string;
  readonly tooLong: string;
  readonly noChannel: (typed: string) => string;
  readonly demoFilling: string;
  /** What is said before anything is asked in the shop that is kept there. */
  readonly demoOpening: (folder: string) => readonly string[];
  /** What happened besides the answer. */
  readonly posted: (place: string, rung: readonly string[], says: string) => string;
  readonly pinned: (place: string, says: string) => string;
  readonly unpinned: (place: string, says: string) => string;
  readonly threadOpened: (place: string, title: string) => string;
  readonly told: (people: readonly string[], says: string) => string;
  /** What is new mostly stands under the first line. */
  readonly edited: (place: string, says: string, under: string | null) => string;
  readonly usage: string;
  readonly unitsArgument: string;
  readonly fault: string;
  readonly pictureAt: (path: string) => string;
  readonly fileAt: (path: string) => string;
  readonly noFiles: string;
  /** A file that was to be taken in cannot be read. */
  readonly noSuchFile: (path: string) => string;
  /** Nothing is missing but the picture. */
  readonly noPicture: string;
};
