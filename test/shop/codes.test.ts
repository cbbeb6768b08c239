import { codes } from './contract/cards.ts';

codes();
