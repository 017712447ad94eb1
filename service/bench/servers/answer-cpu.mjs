/** Tells the bench how much processor time this server has used, in microseconds. */
export function answerCpu(other = () => undefined) {
  process.on('message', (message) => {
    if (message === 'cpu') {
      const { user, system } = process.cpuUsage();
      process.send(user + system);
    } else {
      void Promise.resolve(other(message)).then((answer) => process.send(answer ?? null));
    }
  });
}
