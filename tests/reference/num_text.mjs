// Compares num::shortest with JSON.stringify (the form RFC 8785 prescribes) and the rounding to 8
// decimals with the operations of fhirpath.js 5.2.2 (src/numbers.js), done here by JavaScript itself.
//
// usage: node num_text.mjs DRIVER [COUNT]
import { execFileSync } from "node:child_process";

const [driver, countText] = process.argv.slice(2);
const count = Number(countText ?? 30000);
const view = new DataView(new ArrayBuffer(8));

function bits(x) {
  view.setFloat64(0, x);
  return view.getBigUint64(0).toString(16).padStart(16, "0");
}

function fromBits(pattern) {
  view.setBigUint64(0, BigInt.asUintN(64, pattern));
  return view.getFloat64(0);
}

// A linear congruential generator (Knuth's MMIX constants), so that a failure can be repeated.
let state = 20261201n;
function random64() {
  state = BigInt.asUintN(64, state * 6364136223846793005n + 1442695040888963407n);
  return BigInt.asUintN(64, (state >> 32n) | (state << 32n));
}

function randomUnit() {
  return Number(random64() >> 11n) / 2 ** 53;
}

function ask(questions) {
  const input = questions.map(([name, ...xs]) => `${name} ${xs.map(bits).join(" ")}\n`).join("");
  const lines = execFileSync(driver, { input, maxBuffer: 1 << 28 }).toString().trimEnd().split("\n");
  if (lines.length !== questions.length) throw new Error("questions and answers differ in number");
  return lines;
}

function anyNumber(i) {
  const kind = i % 5;
  if (kind === 0) return (randomUnit() - 0.5) * 400;
  if (kind === 1) return Math.round(randomUnit() * 1e5) / 10 ** (i % 7);
  if (kind === 2) return (2 * Math.floor(randomUnit() * 1e6) - 1e6 + 1) * 5e-9;
  if (kind === 3) return Math.floor(randomUnit() * 1e4) * 1e-8 * 10 ** (i % 20);
  return fromBits(random64());
}

const edges = [0, -0, 1, -1, 0.1, 100, 1e20, 1e21, 123456789012345680000, 1e-6, 1e-7, 5e-324, 1.7976931348623157e308,
  2 ** 52, 2 ** 52 + 1, 2 ** 53, 0.49999999999999994, 0.5, -0.5, 1.5, 2.5, -2.5, 5e-9, -5e-9, 1.5e-8, 1e300, 1.9e300];
const numbers = edges.concat(edges.map((x) => -x));
while (numbers.length < count) {
  const x = anyNumber(numbers.length);
  if (Number.isFinite(x)) numbers.push(x);
}
const pairs = numbers.map((x, i) => [x, i % 3 === 0 ? numbers[(i * 7 + 1) % numbers.length]
  : i % 3 === 1 ? x + (randomUnit() - 0.5) * 4e-8 : x + Math.sign(randomUnit() - 0.5) * 5e-9]);

const toStep = (x) => Math.round(x / 1e-8) * 1e-8;
const compare = ([x, y]) => (toStep(x) < toStep(y) ? -1 : toStep(x) > toStep(y) ? 1 : 0);

let failures = 0;
function check(name, inputs, expected, answers) {
  let wrong = 0;
  answers.forEach((answer, i) => {
    if (answer !== expected(inputs[i])) {
      if (++wrong <= 5) console.log(`  ${name}(${inputs[i]}): expected ${expected(inputs[i])}, got ${answer}`);
    }
  });
  console.log(`${name}: ${answers.length} compared, ${wrong} differ`);
  failures += wrong;
}

check("shortest", numbers, (x) => JSON.stringify(x), ask(numbers.map((x) => ["shortest", x])));
check("round8", numbers, (x) => bits(toStep(x)), ask(numbers.map((x) => ["round8", x])));
check("compare8", pairs, (pair) => String(compare(pair)), ask(pairs.map((pair) => ["compare8", ...pair])));
const sorted = [...numbers].sort((x, y) => x - y);
const rounded = ask(sorted.map((x) => ["round8", x])).map((text) => fromBits(BigInt(`0x${text}`)));
const falls = rounded.filter((x, i) => i > 0 && x < rounded[i - 1]).length;
console.log(`round8 over sorted numbers: ${falls} falls`);
process.exit(failures + falls === 0 ? 0 : 1);
