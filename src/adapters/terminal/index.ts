export { spoken } from '../common/spoken.ts';
export { cardText } from '../common/text.ts';
export { PHONE_WIDTH, runChannel, terminalCall, widthOf } from './channel.ts';
export { answerJson } from './json.ts';
export { writePictures } from './pictures.ts';
