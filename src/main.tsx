import { QueryClientProvider } from "@tanstack/react-query";
import { StrictMode } from "react";
import { createRoot } from "react-dom/client";
import { RouterProvider } from "react-router";
import { queryClient } from "./lib/query-client.ts";
import { registerServiceWorker } from "./lib/register-service-worker.ts";
import { router } from "./router.tsx";
import "./styles/fonts.css";
import "./styles/main.css";

const root = document.getElementById("root");
if (!root) throw new Error("index.html has no #root element");

createRoot(root).render(
  <StrictMode>
    <QueryClientProvider client={queryClient}>
      <RouterProvider router={router} />
    </QueryClientProvider>
  </StrictMode>,
);

// In development files change all the time.
if (import.meta.env.PROD) registerServiceWorker();
