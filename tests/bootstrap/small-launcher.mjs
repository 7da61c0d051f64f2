// What `npm start` stands on, without the server: begins a run, starts one thing, reports it and waits for a signal.
import { openDatabase } from '../../lib/bootstrap/database.mjs';
import { launch } from '../../lib/bootstrap/launch.mjs';
import { say } from '../../lib/bootstrap/trouble.mjs';

await launch('server', 'npm start', 0, async (run) => {
  const what = process.argv[2];
  if (what !== 'sleeper') {
    const { url, server } = await openDatabase(run);
    if (what === 'serving') run.serves('http://127.0.0.1:1');
    say(`ready ${JSON.stringify({ url, pid: server.child.pid })}`);
    await server.ended;
    return 1;
  }
  const sleeper = run.start('sleep', ['600'], { stdio: 'ignore' });
  run.serves('http://127.0.0.1:1');
  say(`ready ${JSON.stringify({ pid: sleeper.child.pid })}`);
  await sleeper.ended;
  return 1;
});
