import "./lib/zod-without-eval.ts";
import "./styles/main.css";
import { QueryClientProvider } from "@tanstack/react-query";
import { StrictMode } from "react";
import { createRoot } from "react-dom/client";
import { RouterProvider } from "react-router-dom";
import { createQueryClient } from "./lib/query-client.ts";
import { createRouter } from "./router.tsx";

const queries = createQueryClient();

// Browsers may keep a page whole and bring it back on "back", after a sign-out too: as it was left, with figures and names.
window.addEventListener("pageshow", (event) => {
  if (event.persisted) window.location.reload();
});

createRoot(document.querySelector("#root")!).render(
  <StrictMode>
    <QueryClientProvider client={queries}>
      <RouterProvider router={createRouter()} />
    </QueryClientProvider>
  </StrictMode>,
);
