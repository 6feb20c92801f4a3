export { Outcome, Solver } from 'odex';
