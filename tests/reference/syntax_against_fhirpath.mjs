// Compares how the rule language groups expressions with HL7's FHIRPath engine [@hl7-fhirpath, grammar]: random
// expressions are parsed by both, and the trees must be the same. What only the rule language refuses must be refused
// for the reason that is visible in the other tree: chained comparisons, and a minus before a call.
// Usage: node syntax_against_fhirpath.mjs <syntax_driver>; ISOHYDRIC_NODE_PROJECT holds node_modules.
import { spawnSync } from 'node:child_process';
import { createRequire } from 'node:module';
import { join } from 'node:path';

const require = createRequire(join(process.env.ISOHYDRIC_NODE_PROJECT, 'package.json'));
const fhirpath = require('fhirpath');

const COUNT = 5000;
const NAMES = ['a', 'b', 'Na', 'limits.pH.low', '`raised-gap`', '1', '7.35', 'true'];
const OPERATORS = ['+', '-', '*', '/', '=', '!=', '<', '<=', '>', '>=', 'and', 'or', 'xor', 'implies'];
const CALLS = ['.abs()', '.not()', '.exists()', '.power(2)', '.log(a + b)'];

let state = 20261201;
const random = (below) => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return Math.floor((state / 2 ** 32) * below);
};
const pick = (list) => list[random(list.length)];

function operand(depth) {
    const kind = random(12);
    if (depth > 0 && kind < 2) return `(${expression(depth - 1)})`;
    if (depth > 0 && kind === 2) return `iif(${expression(depth - 1)}, ${pick(NAMES)}, ${expression(depth - 1)})`;
    if (kind === 3) return `-${operand(depth)}`;
    if (kind < 6) return (depth > 0 ? `(${expression(depth - 1)})` : pick(NAMES)) + pick(CALLS);
    return pick(NAMES);
}

function expression(depth) {
    let text = operand(depth);
    for (let i = random(4); i > 0; --i) text += ` ${pick(OPERATORS)} ${operand(depth)}`;
    return text;
}

const isCall = (node) => node.type === 'InvocationExpression' && node.children[1].type === 'FunctionInvocation';

function parameters(invocation) {
    const list = invocation.children[0].children.find((child) => child.type === 'ParamList');
    return list ? list.children.map(tree) : [];
}

// The other engine's tree in the form of the driver: nested lists, operator first.
function tree(node) {
    const [first, second] = node.children ?? [];
    switch (node.type) {
    case 'EntireExpression':
    case 'TermExpression':
    case 'InvocationTerm':
    case 'ParenthesizedTerm':
        return tree(first);
    case 'PolarityExpression':
        return `(- ${tree(first)})`;
    case 'InvocationExpression':
        return isCall(node) ? `(${[second.text, tree(first), ...parameters(second)].join(' ')})`
                            : `${tree(first)}.${second.text}`;
    case 'FunctionInvocation':
        return `(${[node.text, ...parameters(node)].join(' ')})`;
    case 'MemberInvocation':
    case 'LiteralTerm':
        return node.text;
    default:
        return `(${node.text} ${tree(first)} ${tree(second)})`;
    }
}

// The ids for which the rule language must refuse what the other engine reads so.
function reasons(node, found = new Set()) {
    const chains = node.type === 'EqualityExpression' || node.type === 'InequalityExpression';
    if (chains && node.children[0].type === node.type) found.add('expression-chained-comparison');
    if (node.type === 'PolarityExpression' && isCall(node.children[0])) found.add('expression-unary-minus');
    for (const child of node.children ?? []) reasons(child, found);
    return found;
}

const lines = Array.from({ length: COUNT }, () => expression(2));
const run = spawnSync(process.argv[2], { input: lines.join('\n') + '\n', encoding: 'utf8', maxBuffer: 1 << 28 });
if (run.status !== 0) throw new Error(`the driver failed: ${run.error ?? run.stderr}`);
const answers = run.stdout.trimEnd().split('\n');

let faults = Math.abs(answers.length - COUNT);
let same = 0;
let refused = 0;
lines.forEach((line, i) => {
    const ast = fhirpath.parse(line);
    const expected = reasons(ast);
    const [word, ...ids] = (answers[i] ?? '').split(' ');
    const agreed = word === 'refused'
        ? expected.size > 0 && ids.every((id) => expected.has(id)) && [...expected].every((id) => ids.includes(id))
        : expected.size === 0 && answers[i] === tree(ast);
    if (word === 'refused') ++refused; else if (agreed) ++same;
    if (!agreed && ++faults <= 10) console.error(`${line}\n  here:  ${answers[i]}\n  there: ${tree(ast)} [${[...expected]}]`);
});
console.log(`${COUNT} expressions: ${same} grouped alike, ${refused} refused for a known reason, ${faults} faults`);
process.exit(faults === 0 && same > COUNT / 2 ? 0 : 1);
