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
    const member = signedInMember(req);
    const fitId = idParameter(req, 'fitId');
    // Express answers HEAD here, too: nobody takes anything with it.
    const isTaken = req.method === 'GET';
    const pack = isTaken
      ? await replication.export(member, fitId)
      : await replication.read(member.workspaceId, fitId);
    res.attachment(`kinvale-fit-${pack.result.hash.slice(0, 8)}.zip`).type('application/zip');
    if (!isTaken) {
      res.end();
      return;
    }
    try {
      await pipeline(zipFiles(replicationFiles(pack)), res);
    } catch (error) {
      if (!isPrematureClose(error)) throw error;
      req.log.info({ fitId }, 'a download was broken off');
    }
  });

  return router;
}

/** The reader went away before the last byte. */
function isPrematureClose(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === 'ERR_STREAM_PREMATURE_CLOSE';
}
