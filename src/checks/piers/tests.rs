#[test]
fn show() {
    for name in ["semi", "end-terrace", "bungalow"] {
        let text = std::fs::read_to_string(format!("jobs/{name}.toml")).unwrap();
        let (_, r) = crate::check(name, &text).unwrap();
        let s = r.sections.iter().find(|s| s.id == "piers").unwrap();
        println!("{name}: {:?}\n{}", r.outcome, crate::trace::text::sheet(&s.sheet));
        println!("{:?}", s.sheet.faults);
        for h in &r.holds {
            println!("{} {}", h.mark, h.text);
        }
    }
}
