import { shopContract } from './contract/index.ts';

shopContract('postgres');
