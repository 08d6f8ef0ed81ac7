import { pipeline } from 'node:stream/promises';
import express, { type Router } from 'express';
import { apiRoutes } from '../../contract';
import { signedInMember } from '../../http/member';
import { idParameter, register } from '../../http/register';
import { replicationFiles } from './replication-reply';
import type { ReplicationService } from './replication-service';
import { zipFiles } from './zip-files';

export function replicationRoutes(replication: ReplicationService): Router {
  const router = express.Router();

  register(router, apiRoutes.downloadReplication, async (req, res) => {
    const pack = await replication.export(signedInMember(req), idParameter(req, 'fitId'));
    const zip = zipFiles(replicationFiles(pack));
    res.attachment(`kinvale-fit-${pack.result.hash.slice(0, 8)}.zip`).type('application/zip');
    await pipeline(zip, res);
  });

  return router;
}
