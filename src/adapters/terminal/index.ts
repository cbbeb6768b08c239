export { cardText } from '../common/text.ts';
export { PHONE_WIDTH, runChannel, spoken, terminalCall, widthOf } from './channel.ts';
export { answerJson } from './json.ts';
