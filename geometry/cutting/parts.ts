import { type Finding, error, warning } from './findings.ts';
import { type Plan } from './plan.ts';

/** What a plan lacks beside what it has: a machine and a block each need the others' data, and something must be cut. */
export function checkParts({ machine, block, material, ribs, template }: Plan): Finding[] {
  const findings: Finding[] = [];
  if (!block && machine)
    findings.push(error('block-missing', 'block', 'The machine has no block to cut a core from.'));
  else if (!block && material)
    findings.push(error('block-missing', 'block', 'The material has no block to cut a core from.'));
  if (!material && (machine || block)) {
    const owner = block ? 'block' : 'machine';
    findings.push(
      error('material-missing', 'material', `The ${owner} has no material: feed and mass need one.`),
    );
  }
  if (!machine && !block && !material && !ribs && !template)
    findings.push(warning('nothing-to-cut', 'ribs', 'The plan has neither foam nor ribs nor templates.'));
  return findings;
}
