export * from './number-text';
