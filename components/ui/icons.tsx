interface IconProps {
  readonly className?: string;
}

const stroke = { fill: "none", stroke: "currentColor", strokeWidth: 1.6, "aria-hidden": true } as const;

export const ChevronDown = ({ className }: IconProps) => (
  <svg width="12" height="12" viewBox="0 0 12 12" className={className} {...stroke}>
    <path d="M2 4l4 4 4-4" />
  </svg>
);

export const Cross = ({ className }: IconProps) => (
  <svg width="14" height="14" viewBox="0 0 14 14" className={className} {...stroke}>
    <path d="M2 2l10 10M12 2L2 12" />
  </svg>
);

export const Bars = ({ className }: IconProps) => (
  <svg width="18" height="14" viewBox="0 0 18 14" className={className} {...stroke}>
    <path d="M0 1.5h18M0 7h18M0 12.5h18" />
  </svg>
);
