// Compares the library's units with NLM's UCUM library [@ucum-lhc, version 7.1.10]: every conversion between the
// customary units of every analyte, codes put together at random, and the codes that customary spellings give.
// Usage: node units_against_ucum.mjs <units_driver>; ISOHYDRIC_NODE_PROJECT holds node_modules.
import { spawnSync } from 'node:child_process';
import { createRequire } from 'node:module';
import { join } from 'node:path';

const require = createRequire(join(process.env.ISOHYDRIC_NODE_PROJECT, 'package.json'));
const ucum = require('@lhncbc/ucum-lhc').UcumLhcUtils.getInstance();
const driver = process.argv[2];

// UCUM rounds m[Hg] to 133.322 kPa, 2.9e-6 below the conventional value [@ucum, section 4.4]: allowed once for each power.
const TOLERANCE_WITH_MERCURY = 1e-5;
const TOLERANCE = 1e-9;
// Temperatures near a zero point keep the absolute error of the sum, in kelvins.
const TOLERANCE_AT_ZERO = 1e-11;

const PRESSURE = ['mm[Hg]', 'kPa', 'Pa', 'hPa', 'mbar', 'bar', 'cm[H2O]', 'm[Hg]', '[psi]'];
const ION = ['mmol/L', 'meq/L', 'umol/L', 'mol/L', 'mmol/dL', 'mmol/l', 'meq/l', 'ueq/L'];
const MASS = ['mg/dL', 'g/L', 'mg/L', 'ug/mL', 'mg%'];
const AMOUNT = ['mmol/L', 'umol/L', 'mmol/dL', 'nmol/mL'];
const FRACTION = ['1', '%', '[ppth]', '10*-2', '{fraction}'];

// Molar masses are those of the reference runs and tables, not the library's
// [@ciaaw2021, abridged standard atomic weights]; haemoglobin and albumin are measured ones.
const ANALYTES = [
    { name: 'pressures', codes: PRESSURE },
    { name: 'sodium, potassium, chloride, bicarbonate, gaps, base excess', codes: ION, charge: 1 },
    { name: 'calcium', substance: 'calcium', molarMass: 40.078, charge: 2, codes: [...ION, ...MASS] },
    { name: 'magnesium', substance: 'magnesium', molarMass: 24.305, charge: 2, codes: [...ION, ...MASS] },
    { name: 'phosphate', substance: 'phosphorus', molarMass: 30.974, codes: [...AMOUNT, ...MASS] },
    { name: 'glucose', substance: 'glucose', molarMass: 180.156, codes: [...AMOUNT, ...MASS] },
    { name: 'urea', substance: 'urea', molarMass: 60.056, codes: [...AMOUNT, ...MASS] },
    { name: 'urea nitrogen', substance: 'urea nitrogen', molarMass: 28.014, codes: [...AMOUNT, ...MASS] },
    { name: 'lactate', substance: 'lactate', molarMass: 90.078, codes: [...AMOUNT, ...MASS] },
    { name: 'beta-hydroxybutyrate', substance: 'beta-hydroxybutyrate', molarMass: 104.105, codes: [...AMOUNT, ...MASS] },
    { name: 'ethanol', substance: 'ethanol', molarMass: 46.069, codes: [...AMOUNT, ...MASS, 'g%'] },
    { name: 'creatinine', substance: 'creatinine', molarMass: 113.12, codes: [...AMOUNT, ...MASS] },
    { name: 'albumin', substance: 'albumin', molarMass: 66500, codes: ['g/dL', 'g/L', 'g%', 'umol/L', 'mmol/L'] },
    { name: 'haemoglobin, monomer', substance: 'haemoglobin monomer', molarMass: 16114.5, codes: ['g/dL', 'g/L', 'mmol/L'] },
    { name: 'haemoglobin, tetramer', substance: 'haemoglobin tetramer', molarMass: 64458, codes: ['g/dL', 'g/L', 'mmol/L'] },
    { name: 'protein', codes: ['g/dL', 'g/L', 'mg/mL', 'g%'] },
    { name: 'osmolality', codes: ['mosm/kg', 'osm/kg', 'mmol/kg', 'mosm/kg{H2O}', 'mol/kg'] },
    { name: 'saturations, fractions', codes: FRACTION },
    { name: 'temperature', codes: ['Cel', 'K', '[degF]'] },
    { name: 'altitude', codes: ['m', 'km'] },
    { name: 'age', codes: ['min', 'h', 'd', 'wk', 'mo', 'a', 's'] },
    { name: 'CO2 solubility', codes: ['mmol/L/mm[Hg]', 'mmol/L/kPa', 'mol/L/Pa'] },
];

const SPELLINGS = ['mmHg', 'mm Hg', 'torr', 'kpa', 'mEq/L', 'meq/l', 'mmol/l', 'mM', 'uM', 'mOsm/kg', 'mosmol/kg',
    'mOsm/kg H2O', 'µmol/L', 'μmol/L', '°C', 'C', 'degC', '°F', 'g/dl', 'mg/dl', 'g%', 'mg%', 'percent', '%', 'cmH2O',
    'mbar', 'hPa', 'psi', 'fraction', 'units', 'mval/L', 'mcg/dL', 'mmol / L', 'pH'];

// A linear congruential generator, so that a printed seed repeats the run.
const seed = Number(process.env.ISOHYDRIC_SEED ?? 20260101);
let state = seed;
function random() {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
}
const pick = (list) => list[Math.floor(random() * list.length)];

let failures = 0;
function fail(message) {
    failures += 1;
    if (failures <= 20) {
        console.error(message);
    }
}

function ask(questions) {
    const run = spawnSync(driver, { input: questions.join('\n') + '\n', encoding: 'utf8', maxBuffer: 1 << 28 });
    if (run.status !== 0) {
        throw new Error(`${driver} ended with ${run.status ?? run.error}`);
    }
    const answers = run.stdout.split('\n').slice(0, -1);
    if (answers.length !== questions.length) {
        throw new Error(`${questions.length} questions, ${answers.length} answers`);
    }
    return answers;
}

function toleranceFor(codes) {
    const mercury = codes.flatMap((code) => [...code.matchAll(/\[Hg\]([+-]?\d+)?/g)]);
    const powers = mercury.reduce((sum, match) => sum + Math.abs(Number(match[1] ?? 1)), 0);
    return powers === 0 ? TOLERANCE : TOLERANCE_WITH_MERCURY * powers;
}

function agree(what, ours, theirs, codes) {
    const difference = Math.abs(ours - theirs);
    const allowed = toleranceFor(codes) * Math.max(Math.abs(ours), Math.abs(theirs));
    const atZero = codes.some((code) => ['Cel', '[degF]'].includes(code)) ? TOLERANCE_AT_ZERO : 0;
    if (!(difference <= Math.max(allowed, atZero))) {
        fail(`${what}: ours ${ours}, UCUM ${theirs}`);
    }
}

const isEquivalents = (code) => /eq\b/.test(code);

// The library counts an equivalent as a mole, as UCUM's tables do; whoever knows the charge divides by it. NLM's library
// takes the charge along, so it is put in here.
function inMoles(value, from, to, charge) {
    if (isEquivalents(from) === isEquivalents(to) || charge === undefined) {
        return value;
    }
    return isEquivalents(from) ? value / charge : value * charge;
}

function compareAnalytes() {
    const cases = [];
    for (const analyte of ANALYTES) {
        for (const from of analyte.codes) {
            for (const to of analyte.codes) {
                for (let i = 0; i < 40; i += 1) {
                    const value = i < 8 ? 10 ** (i - 3) : Number((10 ** (random() * 7 - 3)).toPrecision(5));
                    cases.push({ analyte, from, to, value });
                }
            }
        }
    }
    const answers = ask(cases.map(({ analyte, from, to, value }) =>
        ['convert', value, from, to, analyte.substance ?? '-'].join('\t')));
    cases.forEach(({ analyte, from, to, value }, i) => {
        const what = `${analyte.name}: ${value} ${from} in ${to}`;
        const theirs = ucum.convertUnitTo(from, value, to, { molecularWeight: analyte.molarMass, charge: analyte.charge });
        if (theirs.status !== 'succeeded' || answers[i] === 'refused') {
            fail(`${what}: ours ${answers[i]}, UCUM ${theirs.status} ${(theirs.msg ?? []).join('; ')}`);
            return;
        }
        agree(what, inMoles(Number(answers[i]), from, to, analyte.charge), theirs.toVal, [from, to]);
    });
    return cases.length;
}

// Every code that the library accepts is a UCUM code, and of the same size.
function compareRandomCodes(count) {
    const atoms = ['m', 'g', 's', 'min', 'h', 'd', 'wk', 'mo', 'a', 'L', 'l', 'mol', 'osm', 'Pa', 'bar', 'm[Hg]', 'm[H2O]',
        '[psi]', 'K', '%', 'g%', '1', '[ppth]', '10*', 'Cel', '[degF]', '[pH]', 'x', 'mmHg'];
    const prefixes = ['', '', '', '', 'm', 'u', 'n', 'p', 'f', 'a', 'z', 'y', 'c', 'd', 'da', 'h', 'k', 'M', 'G', 'T', 'P', 'E', 'Z', 'Y'];
    const exponents = ['', '', '', '', '', '2', '3', '-1', '-2', '+2', '0', '-'];
    const annotations = ['', '', '', '', '', '{x}', '{H2O}', '{'];
    const part = () => pick(prefixes) + pick(atoms) + pick(exponents) + pick(annotations);
    const codes = Array.from({ length: count }, () => {
        let code = (random() < 0.1 ? '/' : '') + part();
        while (random() < 0.45) {
            code += pick(['.', '/']) + part();
        }
        return code;
    });
    const answers = ask(codes.map((code) => `base\t${code}`));
    let accepted = 0;
    codes.forEach((code, i) => {
        if (answers[i] === 'refused') {
            return;
        }
        accepted += 1;
        const [factor, base] = answers[i].split('\t');
        if (/^(Cel|\[degF\]|\[pH\])/.test(code.replace(/^(1(\{\w*\})?\.)*/, ''))) {
            return; // not ratio scales, compared above; [pH] is a bare number here
        }
        const theirs = ucum.convertUnitTo(code, 1, base);
        if (theirs.status !== 'succeeded') {
            fail(`${code} is accepted, UCUM: ${theirs.status} ${(theirs.msg ?? []).join('; ')}`);
            return;
        }
        agree(`${code} in ${base}`, Number(factor), theirs.toVal, [code]);
    });
    if (accepted < count / 10) {
        fail(`only ${accepted} of ${count} random codes were accepted`);
    }
    return accepted;
}

function compareSpellings() {
    const answers = ask(SPELLINGS.map((written) => `spelling\t${written}`));
    SPELLINGS.forEach((written, i) => {
        if (answers[i] === 'refused' || ucum.validateUnitString(answers[i]).status !== 'valid') {
            fail(`${written} gives ${answers[i]}, which is not a UCUM code`);
        }
    });
    return SPELLINGS.length;
}

const conversions = compareAnalytes();
const codes = compareRandomCodes(20000);
const spellings = compareSpellings();
console.log(`seed ${seed}: ${conversions} conversions, ${codes} random codes, ${spellings} spellings compared; ${failures} differ`);
process.exit(failures === 0 ? 0 : 1);
