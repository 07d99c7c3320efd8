/** Who is in which class: invented first names, each once a class. Nothing else is kept of a child. */
export const CLASS_LISTS = {
  "7B-TARN":
    "Ada Arlo Beth Bram Cleo Dara Eli Fern Gus Hana Idris June Kofi Lena Milo Nia Oren Pia Quinn Rafi Sara Tomas Una Viktor Wren Xenia Yusuf Zoe",
  "7A-TARN":
    "Amara Ben Chidi Delphine Emre Farah Grace Haruto Ilse Jonah Kiri Leif Marisol Nikhil Odette Pavel Rosa Samir Tamsin Umar Vera Wilf",
  "8A-TARN":
    "Abel Bianca Caspian Dina Ezra Freya Gideon Hedda Ivo Juno Keir Linnea Mattias Noor Ottilie Petros Rhea Soren Thandi Yara",
  "7K-QUILL":
    "Anwen Bashir Clem Dorotea Esme Felix Goran Honor Ines Jasper Kamala Lars Mei Nico Otto Priya Rowan Saskia Teo Uri Vida Willa",
  "8L-QUILL":
    "Aino Bodhi Corin Dalia Elio Fiadh Griff Hira Isolde Joaquin Keziah Luca Maren Nasir Olwen Pascal Romy Silas Tova Zaki",
  "6C-QUILL": "Alba Bjorn Carys Dev Etta Finn Gemma Hugo Iris Jomo Kaya Lior Mina Ned Orla Paz Rune Suki",
} as const satisfies { readonly [code: string]: string };

export type ClassCode = keyof typeof CLASS_LISTS;
export const CLASS_CODES = Object.keys(CLASS_LISTS) as readonly ClassCode[];
