import { storeContract } from './contract.ts';

storeContract('sqlite');
