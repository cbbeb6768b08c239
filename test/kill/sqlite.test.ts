import { killContract } from './contract.ts';

killContract('sqlite');
