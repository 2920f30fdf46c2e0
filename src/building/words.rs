//! The choices of the job file, each with the words it is written in.

/// Declares a choice with its words: `ALL`, `WORDS`, `word()` and `from_word()`.
macro_rules! choice {
    ($(#[$doc:meta])* $name:ident { $($(#[$vdoc:meta])* $variant:ident = $word:literal),+ $(,)? }) => {
        $(#[$doc])*
        #[derive(Clone, Copy, Debug, PartialEq, Eq)]
        pub enum $name { $($(#[$vdoc])* $variant),+ }

        impl $name {
            /// The words allowed, in order.
            pub const WORDS: &'static [&'static str] = &[$($word),+];

            /// The word of this choice.
            pub const fn word(self) -> &'static str {
                match self { $(Self::$variant => $word),+ }
            }

            /// The choice written as `word`.
            pub fn from_word(word: &str) -> Option<Self> {
                match word { $($word => Some(Self::$variant),)+ _ => None }
            }
        }
    };
}

choice!(/// Status of an issue.
Status {
    /// Not for use.
    Preliminary = "preliminary",
    /// For others to comment.
    Comment = "for comment",
    /// Submitted.
    BuildingControl = "for building control",
    /// To build from.
    Construction = "for construction",
    /// Record.
    AsBuilt = "as built",
});

impl Status {
    /// Whether it goes out with that: a draft does not.
    pub const fn issued(self) -> bool {
        !matches!(self, Self::Preliminary | Self::Comment)
    }
}

choice!(/// Wind route.
WindRoute {
    /// Route 1.
    Stated = "stated",
    /// Route 2.
    Terrain = "terrain",
    /// Route 3: the UK charts as the engineer reads them.
    Charts = "charts",
});

choice!(/// How the frame of a door or window passes its wind on to the wall.
Frame {
    /// To the two jambs.
    Jambs = "jambs",
    /// All round.
    AllRound = "all round",
    /// To head and sill; of a door to the head alone.
    HeadAndSill = "head and sill",
    /// Nobody knows: the worst of the three.
    Unknown = "unknown",
});

choice!(/// What is above a storey.
FloorKind {
    /// Joists and boards.
    Timber = "timber",
    /// Slab.
    Concrete = "concrete",
    /// Roof only.
    Roof = "roof",
});

choice!(/// A plan direction.
Along {
    /// Across the page.
    X = "x",
    /// Up the page.
    Y = "y",
});

choice!(/// When a wall stands.
Stands {
    /// Stays.
    Both = "before and after",
    /// Comes out.
    Before = "before",
    /// Is added.
    After = "after",
});

choice!(/// How a bracing wall is held for its stiffness.
Ends {
    /// Free at its head.
    Cantilever = "cantilever",
    /// Held against rotation at both ends.
    Fixed = "fixed",
});

choice!(/// How the storey's wind is shared.
ShareBy {
    /// Flexible floor.
    Width = "tributary width",
    /// Stiff floor.
    Stiffness = "stiffness",
});

choice!(/// The joint at the foot of a return.
BaseJoint {
    /// A damp-proof course crosses.
    Dpc = "dpc",
    /// Shown to be bonded.
    Bonded = "bonded",
});

choice!(/// How wind reaches a return.
Path {
    /// The panel spans between returns.
    Sideways = "sideways",
    /// The panel spans between floors.
    UpAndDown = "up and down",
    /// Both act.
    Both = "both",
});

choice!(/// What holds head and foot out of plane.
Restraint {
    /// rho_2 = 1.0.
    Timber = "timber floor",
    /// rho_2 = 0.75.
    Concrete = "concrete floor",
    /// Head not held.
    None = "none",
});

choice!(/// Which leaves of a cavity return act in plane.
Acts {
    /// The loaded leaf alone.
    Loaded = "loaded leaf",
    /// Each leaf with its own dead load, wind shared by thickness.
    Each = "each leaf",
});

choice!(/// Route by which a panel is judged.
PanelRoute {
    /// Bending moment coefficients of Annex E.
    Flexure = "flexure",
    /// Between top and base, or between vertical edges, one way.
    OneWay = "one way",
    /// Arch thrust.
    Arching = "arching",
    /// Limit analysis of the whole panel with its openings; its safe side decides.
    LimitAnalysis = "limit analysis",
});

choice!(/// How two leaves share the wind.
Sharing {
    /// By lateral strength.
    Strength = "strength",
    /// By flexural stiffness.
    Stiffness = "stiffness",
});

choice!(/// How a link of the load path is known.
Proof {
    /// On a sheet of this pack.
    Calculated = "calculated",
    /// By a named rule.
    Rule = "by rule",
    /// By a named person.
    Seen = "seen",
    /// Not known: a hold point.
    Assumed = "assumed",
});

choice!(/// A side of the plan.
Side {
    /// Towards less x.
    Left = "left",
    /// Towards more x.
    Right = "right",
    /// Towards less y.
    Down = "down",
    /// Towards more y.
    Up = "up",
});

choice!(/// How the joists run against an outer wall.
Joists {
    /// They bear on it.
    Into = "into the wall",
    /// Parallel to it.
    Along = "along the wall",
});

choice!(/// What is known of the straps along a floor edge.
StrapsKnown {
    /// None is known to be there.
    None = "none",
    /// By a named person.
    Seen = "seen",
    /// They are part of the work.
    ToBeFitted = "to be fitted",
});

choice!(/// How a floor is shown to carry wind in its plane.
DiaphragmProof {
    /// By its proportions.
    Rule = "by rule",
    /// By its shear flow.
    ShearFlow = "shear flow",
});

choice!(/// Consequence class for disproportionate collapse.
CollapseClass {
    /// Houses up to four storeys, and the like.
    One = "1",
    /// Flats up to four storeys, and the like.
    TwoA = "2A",
});
