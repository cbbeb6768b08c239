export type { Book, LabelledText, TerminalPhrases } from './book.ts';
export type { ChatPhrases, ConfigPhrases, RegistrationPhrases } from './chat.ts';
export { en } from './en/index.ts';
export { type SpokenPicture, speakPictures } from './pictures.ts';
export type { RecordsPhrases } from './records.ts';
export { type ShopUnits, type Show, showIn } from './show.ts';
export {
  type SpokenCard,
  type SpokenCheck,
  type SpokenChoice,
  type SpokenPart,
  speakCard,
  speakRefusal,
} from './speak.ts';
