import { defaultPort } from '../config.ts';
import { buildClient } from './client-build.ts';
import { greet, prepare, type Launch } from './prepare.ts';
import { serve } from './serve.ts';
import { onStop, type Stops } from './stop.ts';

/** `npm start`: everything from one process, at one address, until Ctrl-C. */
export default function start(launch: Launch): Promise<void> {
  const stops = onStop();
  return stops.guard(() => startAll(launch, stops));
}

async function startAll(launch: Launch, stops: Stops): Promise<void> {
  const prepared = await prepare(launch, stops);
  const { settings } = prepared;
  const clientFolder = await buildClient(launch.root);
  const running = await serve({ ...prepared, clientFolder });
  stops.add(() => {
    console.log('\nStopping.');
    return running.stop();
  });
  prepared.announce(running.address);
  if (settings.port === null && running.port !== defaultPort) {
    console.log(
      `- Port ${String(defaultPort)} is taken, so it is ${String(running.port)} this time; PORT sets another.`,
    );
  }
  greet(running.address, launch.begun, prepared.demoPassword);
}
