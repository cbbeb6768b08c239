import { storeContract } from './contract.ts';

storeContract('postgres');
