// Compares read_json with JSON.parse of Node on texts made from seeds by changing one byte at a time: both must accept or
// refuse the same texts, but for the strictness that json.hpp states; accepted texts must have equal values, and the
// characters at every place must be, for JSON.parse, the value that stands there.
// Usage: node json_against_node.mjs PROBE
import {spawnSync} from 'node:child_process';

const seeds = [
    '', ' ', 'null', 'true', 'false', '0', '-0', '-1.5e+3', '1E-2', '0.1', '123456789012345678901234567890',
    '18446744073709551615', '18446744073709551616', '-9223372036854775809', '9007199254740993', '0.1e1', '5e-324', '2e-324',
    '1.7976931348623157e308', '1.7976931348623159e308', '1e999', '-1e999', '1e-999', '4.35', '7.40', '0.30000000000000004',
    '""', '"a"', '"\\"\\\\\\/\\b\\f\\n\\r\\t"', '"\\u0000\\u0041\\u00e9\\u20ac\\ud834\\udd1e"', '"\\ud834"', '"\\udd1e\\ud834"',
    '"\u00b5mol/L \u2212 \u{1d11e}"', '"\u007f\u0080\u2028\u2029"', '\ufeff[]', '[]', '[ ]', '{}', '{ }', '[[],{}]', '[1,2,3]',
    '[1,"a",null,true,{"b":[false]}]', '{"a":1}', '{"a":1,"b":{"c":[1,2,{"d":null}]},"e":""}', '{"a":1,"a":2}', '{"":0," ":1}',
    '{"__proto__":1,"1":2,"0":3}', ' \t\r\n[ 1 , 2 ]\n', '[1]\n[2]', '//a\n1', '/*a*/1', "{'a':1}", '{a:1}', '[NaN]', '[Infinity]',
    '[-Infinity]', '[undefined]', '[True]', '[01]', '[1.]', '[.1]', '[+1]', '[0x10]', '[1e]', '[1_000]', '[1,]', '[,1]', '{"a":1,}',
    '{,}', '{"a"}', '{"a":}', '{:1}', '[', ']', '{', '}', '[}', '"', '"\\', '"\\u', '"\\u12', '"\\x41"', '"a\nb"', '"a\tb"',
];
const byteSets = [...'\0\t\n "\'+,-./0159:E[\\]aeftnu{}\x7f', '\u0085'].map((c) => Buffer.from(c)).concat(
    [0x80, 0xc3, 0xed, 0xf4, 0xff].map((b) => Buffer.from([b])));

function* mutants(seed) {
    const bytes = Buffer.from(seed);
    yield bytes;
    for (let at = 0; at <= bytes.length; ++at) {
        const [before, after] = [bytes.subarray(0, at), bytes.subarray(at)];
        yield before;
        yield after;
        yield Buffer.concat([before, after.subarray(1)]);
        for (const put of byteSets) {
            yield Buffer.concat([before, put, after]);
            yield Buffer.concat([before, put, after.subarray(1)]);
        }
    }
}

const texts = new Map();
for (const seed of seeds) {
    for (const bytes of mutants(seed)) {
        texts.set(bytes.toString('hex'), bytes);
    }
}
for (const depth of [99, 100, 101, 500]) {
    const bytes = Buffer.from('['.repeat(depth) + ']'.repeat(depth));
    texts.set(bytes.toString('hex'), bytes);
}

const run = spawnSync(process.argv[2], {input: [...texts.keys()].join('\n') + '\n', maxBuffer: 1 << 30, encoding: 'utf8'});
if (run.status !== 0) {
    console.error(`the probe failed: ${run.error ?? run.stderr}`);
    process.exit(1);
}
const answers = run.stdout.trimEnd().split('\n').map((line) => JSON.parse(line));
const faults = [];

const decoder = new TextDecoder('utf-8', {fatal: true, ignoreBOM: true});

function parse(bytes) {
    try {
        return {value: JSON.parse(decoder.decode(bytes))};
    } catch {
        return null;
    }
}

// A value in a form that can be compared: numbers by their bits (a minus zero counts as zero), names of objects sorted.
function canonical(value) {
    if (value === null || typeof value === 'boolean') {
        return value;
    }
    if (typeof value === 'number') {
        const bits = Buffer.alloc(8);
        bits.writeDoubleBE(value === 0 ? 0 : value);
        return ['a number', bits.toString('hex')];
    }
    if (typeof value === 'string') {
        return ['a string', Buffer.from(value).toString('hex')];
    }
    if (Array.isArray(value)) {
        return ['an array', value.map(canonical)];
    }
    return ['an object', Object.keys(value).sort().map((name) => [name, canonical(value[name])])];
}

const text = (hex) => decoder.decode(Buffer.from(hex, 'hex'));

// The probe's value in the same form; of repeated names the last counts, as in Node. Checks every place on the way.
function fromProbe([kind, place, content]) {
    let result = content;
    if (kind === 'a number') {
        result = [kind, content === '8000000000000000' ? '0000000000000000' : content];
    } else if (kind === 'a string') {
        result = [kind, content];
    } else if (kind === 'an array') {
        result = [kind, content.map(fromProbe)];
    } else if (kind === 'an object') {
        const members = new Map();
        for (const [name, namePlace, value] of content) {
            members.set(text(name), fromProbe(value));
            if (JSON.parse(text(namePlace)) !== text(name)) {
                throw new Error(`the place of the name ${text(name)} holds ${text(namePlace)}`);
            }
        }
        result = [kind, [...members].sort(([a], [b]) => (a < b ? -1 : 1))];
    }
    const alone = JSON.stringify(canonical(JSON.parse(text(place))));
    if (alone !== JSON.stringify(result)) {
        throw new Error(`at its place stands ${text(place)}`);
    }
    return result;
}

function some(value, test) {
    return test(value) || (value !== null && typeof value === 'object' &&
        Object.entries(value).some(([name, inner]) => test(name) || some(inner, test)));
}

function depth(value) {
    return value !== null && typeof value === 'object' ? 1 + Math.max(0, ...Object.values(value).map(depth)) : 0;
}

function members(answer) {
    const [kind, , content] = answer;
    const inner = kind === 'an object' ? content.map(([, , value]) => value) : kind === 'an array' ? content : [];
    return (kind === 'an object' ? content.length : 0) + inner.reduce((sum, value) => sum + members(value), 0);
}

function nodeMembers(value) {
    if (value === null || typeof value !== 'object') {
        return 0;
    }
    const own = Array.isArray(value) ? 0 : Object.keys(value).length;
    return own + Object.values(value).reduce((sum, inner) => sum + nodeMembers(inner), 0);
}

// Whether a text that Node accepts may be refused: the reason must be seen in Node's own value.
function mayRefuse(id, value, answer) {
    switch (id) {
    case 'json-number-range': return some(value, (each) => typeof each === 'number' && !Number.isFinite(each));
    case 'json-too-deep': return depth(value) > 100;
    case 'json-syntax': return some(value, (each) => typeof each === 'string' && !each.isWellFormed());
    case 'json-duplicate-key': return answer.value !== null && members(answer.value) > nodeMembers(value);
    default: return false;
    }
}

const count = {accepted: 0, refused: 0, stricter: {}};
[...texts.values()].forEach((bytes, index) => {
    const answer = answers[index];
    const complain = (what) => faults.push(`${JSON.stringify(bytes.toString('latin1'))}: ${what}`);
    const node = parse(bytes);
    const isAccepted = answer.errors.length === 0;
    if (node === null) {
        count.refused += 1;
        if (isAccepted) {
            complain('accepted, Node refuses it');
        }
        return;
    }
    if (!isAccepted) {
        const id = answer.errors[0];
        count.stricter[id] = (count.stricter[id] ?? 0) + 1;
        if (!mayRefuse(id, node.value, answer)) {
            complain(`refused with ${id}, Node accepts it`);
        }
        return;
    }
    count.accepted += 1;
    try {
        if (JSON.stringify(fromProbe(answer.value)) !== JSON.stringify(canonical(node.value))) {
            complain('another value than in Node');
        }
    } catch (error) {
        complain(error.message);
    }
});

console.log(`${texts.size} texts: ${count.accepted} accepted by both, ${count.refused} refused by both, refused here only:`,
            count.stricter);
if (answers.length !== texts.size || count.accepted < 1000 || count.refused < 1000) {
    faults.push(`too little compared: ${answers.length} answers`);
}
faults.slice(0, 20).forEach((fault) => console.error(fault));
process.exit(faults.length === 0 ? 0 : 1);
