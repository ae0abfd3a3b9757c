const greek: Record<string, string> = {
  alpha: 'α',
  beta: 'β',
  gamma: 'γ',
  delta: 'δ',
  eta: 'η',
  theta: 'θ',
  kappa: 'κ',
  lambda: 'λ',
  mu: 'μ',
  nu: 'ν',
  rho: 'ρ',
  sigma: 'σ',
  tau: 'τ',
  phi: 'φ',
  psi: 'ψ',
  chi: 'χ',
  xi: 'ξ',
  omega: 'ω',
  epsilon: 'ε',
};
const set = (part: string) => greek[part] ?? part;

/** A symbol's letter and index as they are read: `sigma_m_d` gives σ and m,d. */
export function symbolParts(name: string): { base: string; index: string } {
  const [first = '', ...rest] = name.split('_');
  const letters = /^([A-Za-z]+)(\d+)$/.exec(first);
  const index = [...(letters?.[2] ? [letters[2]] : []), ...rest].map(set).join(',');
  return { base: set(letters?.[1] ?? first), index };
}

/** A symbol set in the bookish face with its index lowered; inside SVG and HTML alike. */
export function Symbol({ name, plain = false }: { name: string; plain?: boolean }) {
  if (plain) return <tspan>{name}</tspan>;
  const { base, index } = symbolParts(name);
  return (
    <>
      <tspan className="font-serif text-sm italic">{base}</tspan>
      {index && (
        <tspan dy={3} className="font-serif text-[0.625rem] italic">
          {index}
        </tspan>
      )}
    </>
  );
}

/** The same for running text. */
export function SymbolText({ name }: { name: string }) {
  const { base, index } = symbolParts(name);
  return (
    <span className="font-serif whitespace-nowrap italic" aria-label={name.replaceAll('_', ' ')} role="img">
      {base}
      {index && <sub className="text-[0.7em]">{index}</sub>}
    </span>
  );
}
