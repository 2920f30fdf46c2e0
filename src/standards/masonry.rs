//! The kinds of unit, mortar, terrain and edge that the standards' tables are entered with.

/// Kind of masonry unit.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum UnitKind {
    /// Clay brick.
    ClayBrick,
    /// Calcium silicate brick.
    CalciumSilicateBrick,
    /// Concrete brick.
    ConcreteBrick,
    /// Aggregate concrete block, dense or lightweight.
    AggregateBlock,
    /// Autoclaved aerated concrete block.
    AacBlock,
    /// Manufactured stone.
    ManufacturedStone,
    /// Dimensioned natural stone.
    NaturalStone,
}

/// Mortar by strength class; lime stands apart.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Mortar {
    /// 12 N/mm².
    M12,
    /// 6 N/mm².
    M6,
    /// 4 N/mm².
    M4,
    /// 2 N/mm².
    M2,
    /// Lime mortar of an existing wall.
    Lime,
}

/// Terrain category of EN 1991-1-4 Table 4.1.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum TerrainCategory {
    /// Sea or coast.
    Zero,
    /// Lake or flat land without obstacles.
    I,
    /// Low vegetation, isolated obstacles.
    II,
    /// Regular cover, suburbs.
    III,
    /// Towns.
    IV,
}

/// How one edge of a panel is held.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Edge {
    /// Not held.
    Free,
    /// Held against moving, free to turn.
    Simple,
    /// Held against moving and turning.
    Continuous,
}
