import { ENGINE_VERSION } from '#shared/simulation/engine-version.ts';
import { useHealth } from './api/health.queries.ts';

/** Engine of this page and state of the server, in one sentence each. */
export function ServerState() {
  const health = useHealth();
  const server = health.isPending
    ? 'Asking the server…'
    : !health.data
      ? `${health.error?.message ?? 'The server does not answer.'} The bench works without it: everything is computed on this device.`
      : `The server answers; its database ${health.data.database}.${
          health.data.engineVersion === ENGINE_VERSION
            ? ''
            : ` It computes with engine version ${health.data.engineVersion}: reload the page.`
        }`;
  return (
    <p role="status">
      Engine version {ENGINE_VERSION}. {server}
    </p>
  );
}
