import katex from 'katex';
import { parseFormula } from '#shared/basis/formula/parse.ts';
import { toTex } from '#shared/basis/formula/tex.ts';

/** KaTeX writes MathML only: no style attributes, which the content-security policy forbids. */
export default function MathematicsSet({ formula }: { formula: string }) {
  const read = parseFormula(formula);
  if (!read.ok) return <code className="font-mono">{formula}</code>;
  const html = katex.renderToString(toTex(read.ast), { output: 'mathml', throwOnError: false });
  return <span className="text-lg" dangerouslySetInnerHTML={{ __html: html }} />;
}
