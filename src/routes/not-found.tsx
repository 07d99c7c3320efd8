import { NotFoundPage } from "../components/not-found-page.tsx";

export function Component() {
  return <NotFoundPage />;
}
