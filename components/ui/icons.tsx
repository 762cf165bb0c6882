/** Drawn signs. The fonts hold no arrows or ticks, so none is ever typed. All are hidden from assistive technology. */
type IconProps = { className?: string; size?: number };

const drawn = (viewBox: string, body: React.ReactNode, defaultSize: number) =>
  function Icon({ className, size = defaultSize }: IconProps) {
    return (
      <svg viewBox={viewBox} width={size} height={size} fill="none" aria-hidden="true" className={className}>
        {body}
      </svg>
    );
  };

export const TurnIcon = drawn(
  "0 0 16 16",
  <path d="M5.5 3.5 10.5 8 5.5 12.5" stroke="currentColor" strokeWidth="1.75" />,
  16,
);
export const DownIcon = drawn(
  "0 0 16 16",
  <path d="M3.5 5.5 8 10.5 12.5 5.5" stroke="currentColor" strokeWidth="1.75" />,
  16,
);
export const SortIcon = drawn(
  "0 0 16 16",
  <path d="M8 3V13M4.5 9.5 8 13 11.5 9.5" stroke="currentColor" strokeWidth="1.75" />,
  12,
);
export const TickIcon = drawn(
  "0 0 16 16",
  <path d="M2.5 8.5 6.3 12 13.5 4" stroke="currentColor" strokeWidth="2" />,
  16,
);
export const BackIcon = drawn(
  "0 0 20 20",
  <path d="M12.5 3.5 6 10 12.5 16.5" stroke="currentColor" strokeWidth="2.2" />,
  20,
);
export const MenuIcon = drawn(
  "0 0 20 20",
  <path d="M2 5H18M2 10H18M2 15H18" stroke="currentColor" strokeWidth="2" />,
  20,
);
export const CameraIcon = drawn(
  "0 0 24 24",
  <g stroke="currentColor" strokeWidth="1.75">
    <path d="M2.5 7.5H7L9 4.5H15L17 7.5H21.5V19.5H2.5Z" strokeLinejoin="round" />
    <circle cx="12" cy="13" r="4" />
  </g>,
  24,
);
export const CautionIcon = drawn(
  "0 0 24 24",
  <>
    <path d="M12 2.5 22.5 21H1.5Z" stroke="currentColor" strokeWidth="2" strokeLinejoin="round" />
    <path d="M12 9V15" stroke="currentColor" strokeWidth="2.2" />
    <circle cx="12" cy="17.9" r="1.3" fill="currentColor" />
  </>,
  24,
);
/** A wire through an eyelet with a lead seal below: the product's sign. */
export const BrandSign = drawn(
  "0 0 28 28",
  <>
    <path d="M19 8H28" stroke="var(--color-copper)" strokeWidth="2.6" />
    <circle cx="14" cy="8" r="6" stroke="currentColor" strokeWidth="2.8" />
    <path d="M5.6 8.3H10.4" stroke="var(--color-paper)" strokeWidth="5.2" />
    <path d="M0 8H14" stroke="var(--color-copper)" strokeWidth="2.6" strokeLinecap="round" />
    <path d="M14 14V18" stroke="var(--color-copper)" strokeWidth="1.8" />
    <circle cx="14" cy="22" r="5" fill="var(--color-lead)" />
  </>,
  28,
);
