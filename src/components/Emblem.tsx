/** The product's emblem: growth rings, the pith in resin. */
export function Emblem({ className = 'size-8' }: { className?: string }) {
  return (
    <svg viewBox="0 0 32 32" className={className} aria-hidden>
      <circle cx="16" cy="16" r="15.5" className="fill-ink" />
      <g className="fill-none stroke-on-ink" strokeWidth="1.5">
        <path d="M16 5.2c6.3-.2 10.9 4.4 10.8 10.7C26.7 22.4 22.1 26.9 15.9 26.8 9.5 26.7 5.1 22.2 5.2 15.9 5.3 9.7 9.8 5.3 16 5.2z" />
        <path d="M16.2 9.1c4-.1 6.8 2.9 6.7 6.9-.1 4.1-3 6.9-7 6.9-4.1-.1-6.9-3-6.8-7 .1-3.9 3-6.8 7.1-6.8z" />
      </g>
      <circle cx="16" cy="16" r="3.6" className="fill-none stroke-on-ink" strokeWidth="1.4" />
      <circle cx="16" cy="16" r="1.5" className="fill-accent" />
    </svg>
  );
}
