// Remakes the canonical form and the hash of rule sets from their files alone, with Node's JSON and SHA-256, and compares
// them with what the reader says: a tiny set, one that extends it, and the shipped set.
// Usage: node rules_hash.mjs READ_RULES SOURCE_DIR
import {execFileSync} from 'node:child_process';
import {createHash} from 'node:crypto';
import {existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';

const [reader, sourceDir] = process.argv.slice(2);
const shipped = join(sourceDir, 'rules');
const kinds = {
    quantities: 'quantity', conditions: 'condition', intervals: 'interval', findings: 'finding', tables: 'table',
    explanations: 'explanation', groups: 'group', checks: 'check', criticals: 'critical value', disorders: 'disorder',
    conventions: 'convention',
};

// Node prints numbers and strings as RFC 8785 asks, and sorts by UTF-16 code units; only the order of members is ours.
const canonical = (value) => {
    if (Array.isArray(value)) return `[${value.map(canonical).join(',')}]`;
    if (value === null || typeof value !== 'object') return JSON.stringify(value);
    const names = Object.keys(value).filter((name) => name !== 'reviewed').sort();
    return `{${names.map((name) => `${JSON.stringify(name)}:${canonical(value[name])}`).join(',')}}`;
};

const refsBelow = (value, refs) => {
    if (value === null || typeof value !== 'object') return refs;
    if (!Array.isArray(value) && typeof value.ref === 'string') refs.add(value.ref);
    Object.values(value).forEach((member) => refsBelow(member, refs));
    return refs;
};

const byId = (left, right) => (left.id < right.id ? -1 : 1);

const entriesOf = (folder, path) => {
    const file = JSON.parse(readFileSync(join(folder, path), 'utf8'));
    return Object.entries(kinds).flatMap(([array, kind]) => (file[array] ?? []).map((entry) => ({entry, kind})));
};

// [{entry, kind}], conventions, analytes and sources of a set and what it extends.
const resolve = (folder, path) => {
    const set = JSON.parse(readFileSync(join(folder, path), 'utf8'));
    const parent = set.extends ? resolve(folder, set.extends) : {entries: [], conventions: {}, sources: []};
    const replaced = (set.replace ?? []).flatMap((file) => entriesOf(folder, file));
    return {
        entries: parent.entries
            .filter(({entry}) => !(set.remove ?? []).includes(entry.id))
            .map((old) => replaced.find(({entry}) => entry.id === old.entry.id) ?? old)
            .concat((set.files ?? []).flatMap((file) => entriesOf(folder, file))),
        conventions: {...parent.conventions, ...set.conventions},
        analytes: set.analytes ? JSON.parse(readFileSync(join(folder, set.analytes), 'utf8')).analytes : parent.analytes,
        sources: parent.sources.concat(set.sources ? JSON.parse(readFileSync(join(folder, set.sources), 'utf8')) : []),
    };
};

const expected = (folder, path) => {
    const set = resolve(folder, path);
    const chosen = Object.values(set.conventions);
    const entries = set.entries.filter(({entry, kind}) => kind !== 'convention' || chosen.includes(entry.id));
    const refs = refsBelow([entries, set.analytes], new Set());
    return canonical({
        analytes: [...set.analytes].sort(byId),
        conventions: set.conventions,
        entries: entries.sort((left, right) => byId(left.entry, right.entry)),
        sources: set.sources.filter(({id}) => refs.has(id)).sort(byId),
    });
};

const head = {source: {ref: 'common-practice'}, reviewed: '2026-12-01'};
const analytes = JSON.parse(readFileSync(join(shipped, 'analytes.json'), 'utf8'));
const cited = [...refsBelow(analytes, new Set())].filter((ref) => ref !== 'common-practice');
const tiny = {
    'analytes.json': analytes,
    'sources.json': [...cited, 'uncited'].map((id) => ({title: `\u00c5 \u20ac "${id}"\n\u{1d11e}`, type: 'book', id, '\ufb33': 1, '\u{1f600}': 2})),
    'rules.json': {
        quantities: [{id: 'tiny', label: 'tiny \u00b5', unit: 'mmol/L', decimals: 1, formula: 'Na * 1.50 - 1 \'mmol/L\'', ...head}],
        intervals: [{id: 'tiny-limits', of: 'tiny', unit: 'mmol/L', low: 1e-7, mid: 0.1, high: 1e21, ...head}],
        conventions: [2, 3].map((value) => ({
            id: `k-${value}`, choice: 'k', title: 't', why: 'w', ...head,
            quantities: [{id: 'k', internal: true, unit: '1', formula: `${value}`, ...head}],
        })),
    },
    'set.json': {id: 'tiny', version: '1', title: 't', analytes: 'analytes.json', sources: 'sources.json',
                 files: ['rules.json'], conventions: {k: 'k-2'}},
    'ours.json': {intervals: [{id: 'tiny-limits', of: 'tiny', unit: 'mmol/L', low: 2.50, ...head}]},
    'more.json': {conditions: [{id: 'added', when: 'tiny > limits.tiny.low', ...head}]},
    'lab.json': {id: 'lab', version: '1', title: 't', extends: 'set.json', replace: ['ours.json'], files: ['more.json'],
                 conventions: {k: 'k-3'}},
};

let faults = 0;
let compared = 0;
const compare = (folder, path) => {
    const wanted = expected(folder, path);
    const found = execFileSync(reader, ['--canonical', folder, path], {encoding: 'utf8'});
    const hash = execFileSync(reader, [folder, path], {encoding: 'utf8'}).trim();
    const wantedHash = createHash('sha256').update(wanted, 'utf8').digest('hex');
    if (found !== wanted || hash !== wantedHash) {
        const at = [...wanted].findIndex((character, index) => character !== found[index]);
        console.error(`${path}: differs at ${at}: ...${wanted.slice(at - 40, at + 40)}... but ...${found.slice(at - 40, at + 40)}...`);
        ++faults;
    }
    ++compared;
};

const folder = mkdtempSync(join(tmpdir(), 'isohydric-rules-'));
try {
    for (const [path, content] of Object.entries(tiny)) {
        writeFileSync(join(folder, path), JSON.stringify(content, null, 3));
    }
    compare(folder, 'set.json');
    compare(folder, 'lab.json');
} finally {
    rmSync(folder, {recursive: true});
}
if (existsSync(join(shipped, 'sets', 'default.json'))) {
    compare(shipped, 'sets/default.json');
}
console.log(`${compared} sets compared, ${faults} differ`);
process.exitCode = faults === 0 ? 0 : 1;
