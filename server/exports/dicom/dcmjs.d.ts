/** The parts of dcmjs 0.51 that are used here; the package ships no types. */
declare module 'dcmjs' {
  /** A value of a dataset by keyword: a sequence is a list of datasets. */
  export type DicomValue = string | number | ArrayBuffer | NaturalDataset | readonly DicomValue[];

  /** Attributes by keyword, such as `PatientName`; `_vrMap` decides where the dictionary allows two representations. */
  export interface NaturalDataset {
    [keyword: string]: DicomValue | Readonly<Record<string, string>>;
  }

  /** One attribute under its tag, eight hexadecimal digits. */
  export interface TaggedAttribute {
    vr: string;
    Value: unknown[];
  }
  export type TaggedDataset = Record<string, TaggedAttribute>;

  export const data: {
    DicomDict: new (meta: TaggedDataset) => {
      dict: TaggedDataset;
      /** The file: preamble, file meta information, dataset in explicit little endian. */
      write(): ArrayBuffer;
    };
    DicomMetaDictionary: {
      denaturalizeDataset(dataset: NaturalDataset): TaggedDataset;
    };
  };
}
