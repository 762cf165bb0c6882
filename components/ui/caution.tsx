import { CautionIcon } from "./icons";

/** A plate for work that can hurt; the same words stand on paper. */
export function Caution({ title, children }: { title: string; children: React.ReactNode }) {
  return (
    <div className="caution" role="note">
      <span className="caution__mark">
        <CautionIcon />
      </span>
      <p className="caution__text">
        <strong>{title}</strong> {children}
      </p>
    </div>
  );
}
