// Compares the engine with HL7's FHIRPath engine (npm fhirpath) on every expression of a rule set and on panels that lie on
// its limits: numbers to |a - b| <= 1e-9 max(1, |a|, |b|), truths exactly, empty included.
// Usage: node fhirpath_against_engine.mjs EXPRESSION_DUMP RULE_FOLDER SET_PATH PANELS ON_LIMIT
// Fails also where fewer than PANELS panels or fewer than ON_LIMIT comparisons between equal numbers were made.
import {spawn} from 'node:child_process';
import {createRequire} from 'node:module';
import {createInterface} from 'node:readline';
import path from 'node:path';

const [driver, rules, set, panelsWanted, onLimitWanted] = process.argv.slice(2);
const project = process.env.ISOHYDRIC_NODE_PROJECT;
if (!onLimitWanted || !project) {
    console.error('arguments or ISOHYDRIC_NODE_PROJECT missing');
    process.exit(2);
}
const fhirpath = createRequire(path.join(project, 'package.json'))('fhirpath');

const mostShown = 20;
const allowed = 1e-9;

// Where the two may differ: our rule language calls a number that is not finite empty, this engine goes on with it.
const departures = [
    {reason: 'a function outside its domain, or an overflow, is empty here and NaN or infinite there',
     holds: (text, ours) => ours === null && /\.(ln|log|exp|power)\(/.test(text)},
];

function plain(result) {
    if (result.length === 0) {
        return null;
    }
    if (result.length > 1) {
        throw new Error(`more than one value: ${JSON.stringify(result)}`);
    }
    const value = result[0];
    return typeof value === 'boolean' || value === null ? value : Number(value);
}

function agree(ours, theirs) {
    if (typeof ours !== 'number' || typeof theirs !== 'number') {
        return ours === theirs;
    }
    return Math.abs(ours - theirs) <= allowed * Math.max(1, Math.abs(ours), Math.abs(theirs));
}

let expressions = [];
let panels = 0;
let onLimit = 0;
let comparisons = 0;
let failures = 0;
const counts = {empty: 0, yes: 0, no: 0, number: 0};
const departed = departures.map(() => 0);

function count(value) {
    ++counts[value === null ? 'empty' : value === true ? 'yes' : value === false ? 'no' : 'number'];
}

function fail(message) {
    if (++failures <= mostShown) {
        console.error(message);
    }
}

function compile({id, text}) {
    try {
        return {id, text, evaluate: fhirpath.compile(text)};
    } catch (error) {
        fail(`${id}: ${text}: ${error.message}`);
        return {id, text, evaluate: () => []};
    }
}

function compare(row) {
    ++panels;
    expressions.forEach(({id, text, evaluate}, index) => {
        const ours = row.results[index];
        const theirs = plain(evaluate(row.names));
        ++comparisons;
        count(ours);
        if (agree(ours, theirs)) {
            return;
        }
        const known = departures.findIndex(({holds}) => holds(text, ours));
        if (known >= 0) {
            ++departed[known];
            return;
        }
        const used = Object.fromEntries(Object.entries(row.names).filter(([name]) => text.includes(name)));
        fail(`${id}: ${text}\n  here ${ours}, there ${theirs}, with ${JSON.stringify(used)}`);
    });
}

const dump = spawn(driver, [rules, set, panelsWanted], {stdio: ['ignore', 'pipe', 'inherit']});
const ended = new Promise((resolve) => dump.on('close', resolve));
dump.on('error', (error) => { console.error(error.message); process.exit(1); });
for await (const line of createInterface({input: dump.stdout})) {
    const read = JSON.parse(line);
    if (read.expressions) {
        expressions = read.expressions.map(compile);
    } else if (read.results) {
        compare(read);
    } else {
        onLimit = read.onLimit;
    }
}
if (await ended !== 0) {
    fail('the driver failed');
}
if (panels < Number(panelsWanted) || expressions.length === 0) {
    fail(`only ${panels} panels and ${expressions.length} expressions`);
}
if (onLimit < Number(onLimitWanted)) {
    fail(`only ${onLimit} comparisons on a limit`);
}
console.log(`${expressions.length} expressions on ${panels} panels: ${comparisons} results, ` +
            `${counts.number} numbers, ${counts.yes} yes, ${counts.no} no, ${counts.empty} empty; ` +
            `${onLimit} comparisons on a limit; ${failures} disagree`);
departures.forEach(({reason}, index) => console.log(`known departure, ${departed[index]} results: ${reason}`));
process.exit(failures === 0 ? 0 : 1);
