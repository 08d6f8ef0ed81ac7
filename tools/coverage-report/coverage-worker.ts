import { parentPort } from 'node:worker_threads';
import { type Block, simulateBlock } from './simulate-block';

if (parentPort === null) throw new Error('expected to run as a worker thread');
const port = parentPort;
port.on('message', (block: Block) => {
  port.postMessage(simulateBlock(block));
});
