import { shopContract } from './contract/index.ts';

shopContract('sqlite');
