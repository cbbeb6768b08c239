export { spoken } from '../common/spoken.ts';
export { cardText } from '../common/text.ts';
export {
  PHONE_WIDTH,
  runChannel,
  sentenceText,
  terminalCall,
  widthOf,
  written,
} from './channel.ts';
export { deliverBy } from './effects.ts';
export { answerJson } from './json.ts';
export { pictureLines, writePictures } from './pictures.ts';
export { personId, speakerCalled } from './speaker.ts';
