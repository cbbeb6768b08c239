export { atLeast, ROLES, type Role } from '../shop/index.ts';
