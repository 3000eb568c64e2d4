import { buildClient } from './client-build.ts';
import { greet, prepare, type Launch } from './prepare.ts';
import { serve } from './serve.ts';

/** `npm start`: everything from one process, at one address, until Ctrl-C. */
export default async function start(launch: Launch): Promise<void> {
  const prepared = await prepare(launch);
  const { settings, stops } = prepared;
  const clientFolder = await buildClient(launch.root);
  const running = await serve({ ...prepared, clientFolder });
  stops.add(() => {
    console.log('\nStopping.');
    return running.stop();
  });
  prepared.announce(running.address);
  if (settings.port === null && running.port !== 8000) {
    console.log(`- Port 8000 is taken, so it is ${String(running.port)} this time; PORT sets another.`);
  }
  greet(running.address, launch.begun, prepared.demoPassword);
}
