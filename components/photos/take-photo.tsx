import type { ReactNode } from "react";

type Props = { className: string; label: string; onFile: (file: File) => void; children: ReactNode };

/** A target that opens the camera or the library. */
export function TakePhoto({ className, label, onFile, children }: Props) {
  return (
    <label className={`${className} take-photo`}>
      <input
        type="file"
        className="vh"
        accept="image/jpeg,image/png,image/webp"
        aria-label={label}
        onChange={(event) => {
          const file = event.target.files?.[0];
          event.target.value = "";
          if (file) onFile(file);
        }}
      />
      {children}
    </label>
  );
}
