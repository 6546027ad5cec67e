import type { Migration } from './run';

export const up: Migration = async (run) => {
  await run(`CREATE TABLE compounds (
    id UUID PRIMARY KEY,
    name VARCHAR(200) NOT NULL UNIQUE,
    casNumber VARCHAR(12) NULL UNIQUE,
    formula VARCHAR(80) NULL,
    molarMassGMol DOUBLE NULL,
    smiles VARCHAR(500) NULL,
    inchiKey CHAR(27) NULL,
    peroxideClass ENUM('A', 'B', 'C') NULL,
    version INT NOT NULL DEFAULT 0,
    createdAt DATETIME(3) NOT NULL,
    updatedAt DATETIME(3) NOT NULL,
    KEY byFormula (formula),
    KEY byInchiKey (inchiKey)
  )`);
  await run(`CREATE TABLE compound_synonyms (
    id UUID PRIMARY KEY,
    compoundId UUID NOT NULL,
    name VARCHAR(200) NOT NULL,
    UNIQUE KEY onceACompound (compoundId, name),
    KEY byName (name),
    FOREIGN KEY (compoundId) REFERENCES compounds (id)
  )`);
  // A correction is a new row that names the one it replaces; nothing is ever overwritten.
  await run(`CREATE TABLE literature_values (
    id UUID PRIMARY KEY,
    compoundId UUID NOT NULL,
    property VARCHAR(60) NOT NULL,
    value DOUBLE NULL,
    coefficients JSON NULL,
    unit VARCHAR(30) NOT NULL,
    temperatureC DOUBLE NULL,
    pressureKPa DOUBLE NULL,
    wavelengthNm DOUBLE NULL,
    rangeMinC DOUBLE NULL,
    rangeMaxC DOUBLE NULL,
    uncertainty DOUBLE NULL,
    source VARCHAR(400) NOT NULL,
    note VARCHAR(400) NULL,
    preferred BOOLEAN NOT NULL DEFAULT FALSE,
    replacesId UUID NULL,
    replacedAt DATETIME(3) NULL,
    reason VARCHAR(1000) NULL,
    addedById UUID NULL,
    version INT NOT NULL DEFAULT 0,
    createdAt DATETIME(3) NOT NULL,
    updatedAt DATETIME(3) NOT NULL,
    KEY byProperty (compoundId, property, preferred),
    FOREIGN KEY (compoundId) REFERENCES compounds (id),
    FOREIGN KEY (replacesId) REFERENCES literature_values (id)
  )`);
  // An edition never changes after it is written; a fraction keeps the one it was judged by.
  await run(`CREATE TABLE specifications (
    id UUID PRIMARY KEY,
    groupId UUID NOT NULL,
    compoundId UUID NOT NULL,
    grade VARCHAR(80) NOT NULL,
    edition INT NOT NULL,
    decisionRule ENUM('simple', 'guarded') NOT NULL,
    criteria JSON NOT NULL,
    note VARCHAR(1000) NULL,
    writtenById UUID NOT NULL,
    approvedById UUID NULL,
    approvedAt DATETIME(3) NULL,
    version INT NOT NULL DEFAULT 0,
    createdAt DATETIME(3) NOT NULL,
    updatedAt DATETIME(3) NOT NULL,
    UNIQUE KEY oneEdition (groupId, compoundId, grade, edition),
    FOREIGN KEY (groupId) REFERENCES \`groups\` (id),
    FOREIGN KEY (compoundId) REFERENCES compounds (id)
  )`);
};
