import type { ReactNode } from "react";

export interface GallerySectionProps {
  title: string;
  children: ReactNode;
}

/** One titled group of the gallery. */
export function GallerySection({ title, children }: GallerySectionProps) {
  const id = title.toLowerCase().replaceAll(" ", "-");
  return (
    <section aria-labelledby={id} className="border-t border-line pt-5 pb-8">
      <h2 id={id} className="mb-4">
        {title}
      </h2>
      <div className="space-y-5">{children}</div>
    </section>
  );
}
