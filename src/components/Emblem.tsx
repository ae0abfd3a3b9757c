/** The product's emblem: growth rings, the pith in resin. */
export function Emblem({ className = 'size-8' }: { className?: string }) {
  return (
    <svg viewBox="0 0 32 32" className={className} aria-hidden>
      <circle cx="16" cy="16" r="15.5" className="fill-ink" />
      <g className="fill-none stroke-on-ink" strokeWidth="1.5">
        <path d="M16 5.2c6.3-.2 10.9 4.4 10.8 10.7C26.700 22.400 22.100 26.900 15.900 26.800 9.500 26.700 5.100 22.200 5.200 15.900 5.300 9.700 9.800 5.300 16 5.200z" />
        <path d="M16.200 9.100c4-.100 6.800 2.900 6.700 6.900-.100 4.100-3 6.900-7 6.900-4.100-.100-6.900-3-6.800-7 .100-3.900 3-6.800 7.100-6.800z" />
      </g>
      <circle cx="16" cy="16" r="3.600" className="fill-none stroke-on-ink" strokeWidth="1.400" />
      <circle cx="16" cy="16" r="1.500" className="fill-accent" />
    </svg>
  );
}
