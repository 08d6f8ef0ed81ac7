const mostListed = 20;
/** Below this a spec is not worth a line. */
const leastMs = 1000;

/** A reporter that lists the specs that took longest, so that nobody has to guess where the time goes. */
export class SlowestSpecs {
  reporterCapabilities = { parallel: true };
  #specs = [];

  specDone({ fullName, duration }) {
    if (duration >= leastMs) this.#specs.push({ fullName, duration });
  }

  jasmineDone() {
    const slowest = this.#specs
      .sort((left, right) => right.duration - left.duration)
      .slice(0, mostListed);
    if (slowest.length === 0) return;
    console.log('\nThe slowest specs, in seconds:');
    for (const { fullName, duration } of slowest)
      console.log(`${(duration / 1000).toFixed(1).padStart(6)}  ${fullName}`);
  }
}
