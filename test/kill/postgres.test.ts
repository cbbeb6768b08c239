import { killContract } from './contract.ts';

killContract('postgres');
