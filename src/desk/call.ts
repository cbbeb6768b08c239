/** A person as their platform knows them. */
export type Person = {
  readonly id: string;
  readonly name: string;
  /** The platform's own roles or user groups they are in. */
  readonly groups?: readonly string[];
  /** Manages the server or installed the app; not said where the platform knows no such thing. */
  readonly manages?: boolean;
};

/** Somebody, or a group of people, by the platform's own id. */
export type Named = { readonly id: string; readonly name: string };

/** Whom the platform itself knows by what is typed: a mention, an id, a name. */
export type Directory = {
  readonly person: (called: string) => Named | null;
  readonly group: (called: string) => Named | null;
  readonly groups: () => readonly Named[];
};

/** A file that came with a request, as text. */
export type Attached = { readonly name: string; readonly text: string };

/** Where a request was made and where the reply belongs. */
export type Place = {
  readonly channel: string;
  readonly thread: string | null;
  /** Only the person who asked sees the reply. */
  readonly isPrivate: boolean;
};

/** What an adapter hands the desk. */
export type Call = {
  readonly shop: string;
  readonly person: Person;
  readonly place: Place;
  /** One interaction acts once, however often the platform sends it. */
  readonly interactionId: string;
  readonly attached?: readonly Attached[];
  /** Where not said, what is typed is the id. */
  readonly directory?: Directory;
  readonly given: /** A line of plain words, with or without its slash command. */
    | { readonly words: string }
    /** Named options of a form: each is read with the same words as a line. */
    | {
        readonly path: readonly string[];
        readonly options: Options;
      }
    /** A button of an earlier answer. */
    | { readonly pressed: Pressed };
};

export type Options = Readonly<Record<string, string | number | boolean>>;

export type Pressed = {
  /** The interaction whose answer carries the button. */
  readonly of: string;
  /** Which of its choices. */
  readonly choice: number;
  /** What a form asked for besides. */
  readonly added?: Options;
};
