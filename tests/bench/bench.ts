import { engineBench } from './engine-bench';

/** Every benchmark by its name; each yields numbers by theirs. */
const BENCHES: Readonly<Record<string, () => object>> = {
  engine: engineBench,
};

const results = Object.fromEntries(Object.entries(BENCHES).map(([name, bench]) => [name, bench()]));

if (process.argv.includes('--json')) {
  console.log(JSON.stringify(results));
} else {
  for (const [name, numbers] of Object.entries(results)) {
    console.log(name);
    for (const [what, value] of Object.entries(numbers)) {
      console.log(`  ${what.padEnd(16)} ${Number(value).toLocaleString('en-US').padStart(14)}`);
    }
  }
}
