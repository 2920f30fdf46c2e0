//! Names of algorithms and attributes: object identifiers of RFC 3279, RFC 5480, RFC 5652, RFC 5754 and RFC 5035.

/// RSA, as a key and as a signature whose hash stands elsewhere.
pub const RSA: &str = "1.2.840.113549.1.1.1";
/// RSA with PKCS#1 v1.5 and SHA-256.
pub const RSA_SHA256: &str = "1.2.840.113549.1.1.11";
/// The same with SHA-384.
pub const RSA_SHA384: &str = "1.2.840.113549.1.1.12";
/// The same with SHA-512.
pub const RSA_SHA512: &str = "1.2.840.113549.1.1.13";
/// A key on an elliptic curve.
pub const EC: &str = "1.2.840.10045.2.1";
/// The curve P-256.
pub const P256: &str = "1.2.840.10045.3.1.7";
/// The curve P-384.
pub const P384: &str = "1.3.132.0.34";
/// ECDSA with SHA-256.
pub const ECDSA_SHA256: &str = "1.2.840.10045.4.3.2";
/// ECDSA with SHA-384.
pub const ECDSA_SHA384: &str = "1.2.840.10045.4.3.3";
/// ECDSA with SHA-512.
pub const ECDSA_SHA512: &str = "1.2.840.10045.4.3.4";
/// SHA-256.
pub const SHA256: &str = "2.16.840.1.101.3.4.2.1";
/// SHA-384.
pub const SHA384: &str = "2.16.840.1.101.3.4.2.2";
/// SHA-512.
pub const SHA512: &str = "2.16.840.1.101.3.4.2.3";
/// Content of a CMS: data.
pub const DATA: &str = "1.2.840.113549.1.7.1";
/// Content of a CMS: signed data.
pub const SIGNED_DATA: &str = "1.2.840.113549.1.7.2";
/// Signed attribute: what kind of content.
pub const CONTENT_TYPE: &str = "1.2.840.113549.1.9.3";
/// Signed attribute: digest of the content.
pub const MESSAGE_DIGEST: &str = "1.2.840.113549.1.9.4";
/// Signed attribute: which certificate, by its digest.
pub const SIGNING_CERTIFICATE: &str = "1.2.840.113549.1.9.16.2.47";
