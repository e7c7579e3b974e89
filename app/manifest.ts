import type { MetadataRoute } from "next";

/** What a phone needs to put Bellward on its home screen. It opens at the athlete's day, which works without a net. */
export default function manifest(): MetadataRoute.Manifest {
  return {
    id: "/today",
    name: "Bellward",
    short_name: "Bellward",
    description: "Your camp, day by day: what to lift, and what you did.",
    start_url: "/today",
    scope: "/",
    display: "standalone",
    orientation: "portrait",
    lang: "en",
    background_color: "#dfe4e6",
    theme_color: "#12171c",
    icons: [
      { src: "/icons/icon-192.png", sizes: "192x192", type: "image/png" },
      { src: "/icons/icon-512.png", sizes: "512x512", type: "image/png" },
      { src: "/icons/maskable-512.png", sizes: "512x512", type: "image/png", purpose: "maskable" },
    ],
  };
}
