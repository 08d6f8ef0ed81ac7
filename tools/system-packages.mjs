import { existsSync } from 'node:fs';
import { run } from './child-process.mjs';
import { CommandFailed, PlainFailure } from './plain-failure.mjs';

const keepNoCluster = '/etc/postgresql-common/createcluster.d/kinvale.conf';

/**
 * Installs Debian packages, as root or through sudo without a password. Never interrupted half-way: dpkg is left
 * to finish what it began.
 *
 * @throws {PlainFailure} where this user has no right to install.
 */
export async function installPackages(packages, purpose, say) {
  const list = packages.join(' ');
  const wanted = `${purpose} is missing`;
  if (!existsSync('/usr/bin/apt-get')) {
    throw new PlainFailure(
      `${wanted} and there is no apt-get here to install it: install Debian's ${list}, or the like, and start again.`,
    );
  }
  const prefix = await rightToInstall();
  if (prefix === undefined) {
    throw new PlainFailure(
      `${wanted} and this user has no right to install it: run "apt-get install ${list}" as root, then start again.`,
    );
  }
  say(`Installing ${purpose} from Debian's packages (${list})`);
  const asRoot = async (script) => {
    const [command, ...args] = [...prefix, 'sh', '-c', script];
    await run(command, args, { env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' } });
  };
  // Debian would start a cluster for the whole machine on port 5432; we bring our own.
  await asRoot(
    `set -e; mkdir -p /etc/postgresql-common/createcluster.d; echo 'create_main_cluster = false' > ${keepNoCluster}`,
  );
  try {
    await asRoot(
      `apt-get -qq update && DEBIAN_FRONTEND=noninteractive apt-get -qq install -y --no-install-recommends ${list}`,
    );
  } finally {
    await asRoot(`rm -f ${keepNoCluster}`);
  }
}

async function rightToInstall() {
  if (process.getuid() === 0) return [];
  try {
    await run('sudo', ['-n', 'true']);
    return ['sudo', '-n'];
  } catch (error) {
    if (error instanceof CommandFailed || ['ENOENT', 'EACCES'].includes(error.code))
      return undefined;
    throw error;
  }
}
